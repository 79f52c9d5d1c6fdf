import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { openDatabase } from '@/server/database'
import { migrate, migrateDown } from '@/server/migrate'
import { buildOrganisation } from '@/tests/support/buildOrganisation'
import { buildPerson } from '@/tests/support/buildPerson'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'

let testApp: TestApp
beforeAll(async () => {
  testApp = await createTestApp()
})
afterAll(() => testApp.close())

/** Tables that hold nothing of an organisation. */
const COMMON_TABLES = ['schema_step', 'spatial_ref_sys']

describe('the catalogue', () => {
  it('has row-level security enabled and forced on every table, each with its organisation', async () => {
    const tables = await testApp.owner.rows<{
      name: string
      has_column: boolean
      is_enabled: boolean
      is_forced: boolean
      policies: string[]
    }>(
      `SELECT c.relname AS name, c.relrowsecurity AS is_enabled, c.relforcerowsecurity AS is_forced,
         EXISTS (SELECT FROM pg_attribute a WHERE a.attrelid = c.oid AND a.attname = 'organisation_id' AND a.attnotnull) AS has_column,
         ARRAY(SELECT p.policyname::text FROM pg_policies p WHERE p.tablename = c.relname AND 'tallystone_app' = ANY (p.roles)) AS policies
       FROM pg_class c JOIN pg_namespace n ON n.oid = c.relnamespace
       WHERE n.nspname = 'public' AND c.relkind IN ('r', 'p') ORDER BY 1`,
    )
    const ours = tables.filter(({ name }) => !COMMON_TABLES.includes(name))

    expect(ours.length).toBeGreaterThan(20)
    for (const table of ours) {
      expect(table).toEqual({
        name: table.name,
        has_column: true,
        is_enabled: true,
        is_forced: true,
        policies: [`${table.name}_own_organisation`],
      })
    }
  })

  it('begins every primary key, and every foreign key between tables of an organisation, with the organisation', async () => {
    const keys = await testApp.owner.rows<{ name: string; first: string; other: string | null }>(
      `SELECT con.conname AS name, own.attname AS first, far.attname AS other
       FROM pg_constraint con
       JOIN pg_attribute own ON own.attrelid = con.conrelid AND own.attnum = con.conkey[1]
       LEFT JOIN pg_attribute far ON far.attrelid = con.confrelid AND far.attnum = con.confkey[1]
       JOIN pg_class c ON c.oid = con.conrelid JOIN pg_namespace n ON n.oid = c.relnamespace
       WHERE n.nspname = 'public' AND con.contype IN ('p', 'f') AND c.relname NOT IN ('schema_step', 'spatial_ref_sys')`,
    )
    const astray = keys.filter(
      ({ first, other }) => first !== 'organisation_id' || (other !== null && other !== 'organisation_id'),
    )
    expect(astray).toEqual([])
  })

  it('lets the app in as a role that owns nothing and passes no policy', async () => {
    const [role] = await testApp.owner.rows(
      `SELECT rolsuper, rolbypassrls, rolcreaterole, rolcreatedb,
         (SELECT count(*)::integer FROM pg_class c WHERE c.relowner = r.oid) AS owned
       FROM pg_roles r WHERE rolname = 'tallystone_app'`,
    )
    expect(role).toEqual({ rolsuper: false, rolbypassrls: false, rolcreaterole: false, rolcreatedb: false, owned: 0 })
    const [current] = await testApp.context.database.selectPublic('SELECT current_user::text AS name')
    expect(current).toEqual({ name: 'tallystone_app' })
  })

  it('opens to the app only the functions that sign-in and the nightly job need, each with a fixed search path', async () => {
    const functions = await testApp.owner.rows<{ name: string; is_open: boolean; is_fixed: boolean }>(
      `SELECT p.proname AS name, has_function_privilege('public', p.oid, 'EXECUTE') AS is_open,
         coalesce(array_to_string(p.proconfig, ',') LIKE 'search_path=public%', false) AS is_fixed
       FROM pg_proc p JOIN pg_namespace n ON n.oid = p.pronamespace
       WHERE n.nspname = 'public' AND p.prosecdef
         AND NOT EXISTS (SELECT FROM pg_depend d WHERE d.objid = p.oid AND d.deptype = 'e') ORDER BY 1`,
    )
    expect(functions).toEqual(
      ['is_device_of', 'one_time_token_lookup', 'organisations_to_tidy', 'sign_in_lookup', 'signed_in_lookup'].map(
        (name) => ({
          name,
          is_open: false,
          is_fixed: true,
        }),
      ),
    )
  })
})

describe('a transaction of one organisation', () => {
  it('sees, changes and adds nothing of another, and nothing at all without one', async () => {
    const mine = await buildPerson(testApp)
    const other = await buildPerson(testApp)
    const { database } = testApp.context

    const seen = await database.withScope(mine, (scope) =>
      scope.select<{ person_id: string }>('SELECT person_id FROM person'),
    )
    const changed = await database.withScope(mine, (scope) =>
      scope.select(`UPDATE person SET name = 'x' WHERE person_id = $personId RETURNING person_id`, {
        personId: other.personId,
      }),
    )
    const added = database.withScope(mine, (scope) =>
      scope.execute(`INSERT INTO audit_entry (organisation_id, action) VALUES ($organisationId, 'x')`, {
        organisationId: other.organisationId,
      }),
    )

    expect(seen).toEqual([{ person_id: mine.personId }])
    expect(changed).toEqual([])
    await expect(added).rejects.toThrow(/row-level security/)
    expect(await database.selectPublic('SELECT person_id FROM person')).toEqual([])
  })

  it('leaves nothing on the pooled connection, after success, error and a broken-off statement', async () => {
    const database = openDatabase(testApp.appUrl, { poolSize: 1 })
    const [one, two] = [await buildPerson(testApp), await buildPerson(testApp)]
    const ids = () => database.selectPublic<{ n: number }>('SELECT count(*)::integer AS n FROM person')

    await database.withScope(one, (scope) => scope.select('SELECT 1'))
    expect(await ids()).toEqual([{ n: 0 }])
    await database.withScope(two, () => Promise.reject(new Error('on purpose'))).catch(() => undefined)
    expect(await ids()).toEqual([{ n: 0 }])
    await database.withScope(one, (scope) => scope.select('SELECT 1 / 0')).catch(() => undefined)
    expect(await ids()).toEqual([{ n: 0 }])
    const seen = await database.withScope(two, (scope) => scope.select('SELECT person_id FROM person'))
    expect(seen).toEqual([{ person_id: two.personId }])
    await database.close()
  })

  it('may not touch the tables of the owner: no new table, no rewritten audit trail', async () => {
    const actor = await buildPerson(testApp)
    const attempts = [
      'CREATE TABLE planted (x integer)',
      'DROP TABLE audit_entry',
      'ALTER TABLE person DISABLE ROW LEVEL SECURITY',
      `UPDATE audit_entry SET action = 'x'`,
      'DELETE FROM audit_entry',
      'SET ROLE tallystone_owner',
      'TRUNCATE person CASCADE',
    ]
    for (const sql of attempts) {
      const attempt = testApp.context.database.withScope(actor, (scope) => scope.execute(sql))
      await expect(attempt, sql).rejects.toThrow(/permission denied|must be owner/)
    }
  })
})

it('takes every step of the schema back and forward again', async () => {
  await buildOrganisation(testApp, { name: randomUUID() })
  await migrateDown(testApp.ownerUrl)
  const left = await testApp.owner.rows(
    `SELECT relname FROM pg_class c JOIN pg_namespace n ON n.oid = c.relnamespace
     WHERE n.nspname IN ('public', 'pgboss') AND relkind = 'r' AND relname NOT IN ('schema_step', 'spatial_ref_sys')`,
  )
  expect(left).toEqual([])

  const taken = await migrate(testApp.ownerUrl)

  expect(taken.length).toBeGreaterThanOrEqual(5)
  expect(await migrate(testApp.ownerUrl)).toEqual([])
})
