import { Client, type QueryResultRow } from 'pg'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { createTestDatabase } from '@/tests/support/testDatabase'

let appUrl = ''
let ownerUrl = ''
let drop = async () => {}

beforeAll(async () => {
  const database = await createTestDatabase()
  appUrl = database.appUrl
  ownerUrl = database.ownerUrl
  drop = database.drop
})
afterAll(() => drop())

async function ask<Row extends QueryResultRow>(url: string, sql: string): Promise<Row[]> {
  const client = new Client({ connectionString: url })
  await client.connect()
  try {
    return (await client.query<Row>(sql)).rows
  } finally {
    await client.end()
  }
}

it('connects the app as a role that is neither superuser nor past row-level security', async () => {
  const [role] = await ask(
    appUrl,
    'SELECT rolname, rolsuper, rolbypassrls, rolcreatedb, rolcreaterole FROM pg_roles WHERE rolname = current_user',
  )

  expect(role).toEqual({
    rolname: 'tallystone_app',
    rolsuper: false,
    rolbypassrls: false,
    rolcreatedb: false,
    rolcreaterole: false,
  })
})

it('leaves the app owner of nothing', async () => {
  expect(
    await ask(appUrl, 'SELECT relname FROM pg_class JOIN pg_roles r ON r.oid = relowner WHERE rolname = current_user'),
  ).toEqual([])
  await expect(ask(appUrl, 'CREATE TABLE planted (a int)')).rejects.toThrow('permission denied')
})

it('forces row-level security on every table that bears an organisation', async () => {
  const open = await ask(
    ownerUrl,
    `SELECT c.relname FROM pg_class c JOIN pg_attribute a ON a.attrelid = c.oid AND a.attname = 'organisation_id'
     WHERE c.relkind IN ('r', 'p') AND c.relnamespace = 'public'::regnamespace
       AND NOT (c.relrowsecurity AND c.relforcerowsecurity)`,
  )

  expect(open).toEqual([])
})

it('has PostGIS in it', async () => {
  const [row] = await ask<{ area: number }>(
    appUrl,
    `SELECT ST_Area(ST_GeomFromText('POLYGON((0 0,0 2,3 2,3 0,0 0))')) AS area`,
  )

  expect(row?.area).toBe(6)
})

it('gives each file a database of its own', async () => {
  const other = await createTestDatabase()
  await ask(other.ownerUrl, 'CREATE TABLE only_here (a int)')

  await expect(ask(ownerUrl, 'SELECT * FROM only_here')).rejects.toThrow('does not exist')
  await other.drop()
  await expect(ask(other.ownerUrl, 'SELECT 1')).rejects.toThrow('does not exist')
})
