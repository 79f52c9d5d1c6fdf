import { createHash, randomBytes } from 'node:crypto'
import { Client } from 'pg'

const OWNER = 'tallystone_owner'
const APP = 'tallystone_app'

/** A PostgreSQL server on which tests make and drop databases. */
export interface TestDatabaseServer {
  readonly adminUrl: string
  /** Name of a migrated database that others are copied from. */
  readonly template: string
}

export interface TestDatabase {
  /** As the app's role: neither owner nor superuser. */
  readonly appUrl: string
  /** As the owner of the tables. */
  readonly ownerUrl: string
  drop(): Promise<void>
}

/**
 * Makes the two roles and a template on a server.
 *
 * @param adminUrl a superuser's address
 * @param fill makes the tables, as the owner, and whatever shall be in every copy
 */
export async function prepareTestServer(
  adminUrl: string,
  fill: (urls: Pick<TestDatabase, 'appUrl' | 'ownerUrl'>) => Promise<unknown>,
): Promise<TestDatabaseServer> {
  await asAdmin(adminUrl, async (client) => {
    for (const role of [OWNER, APP]) {
      await client.query(
        `DO $$ BEGIN CREATE ROLE ${role}; EXCEPTION WHEN duplicate_object OR unique_violation THEN NULL; END $$`,
      )
      await client.query(`ALTER ROLE ${role} LOGIN NOSUPERUSER NOBYPASSRLS PASSWORD '${passwordOf(role, adminUrl)}'`)
    }
  })
  const template = `template_${randomName()}`
  const urls = await createDatabase(adminUrl, template, 'template1')
  await asAdmin(withDatabase(adminUrl, template), (client) => client.query('CREATE EXTENSION IF NOT EXISTS postgis'))
  await fill(urls)
  return { adminUrl, template }
}

/** Drops the template; for servers that outlive the tests. */
export function dropTemplate({ adminUrl, template }: TestDatabaseServer): Promise<void> {
  return dropDatabase(adminUrl, template)
}

/** Copies the template into a database of its own. */
export function copyTemplate({ adminUrl, template }: TestDatabaseServer): Promise<TestDatabase> {
  return createDatabase(adminUrl, `test_${randomName()}`, template)
}

async function createDatabase(adminUrl: string, name: string, template: string): Promise<TestDatabase> {
  await asAdmin(adminUrl, (client) => client.query(`CREATE DATABASE ${name} OWNER ${OWNER} TEMPLATE ${template}`))
  return {
    appUrl: withDatabase(withRole(adminUrl, APP), name),
    ownerUrl: withDatabase(withRole(adminUrl, OWNER), name),
    drop: () => dropDatabase(adminUrl, name),
  }
}

async function dropDatabase(adminUrl: string, name: string): Promise<void> {
  await asAdmin(adminUrl, (client) => client.query(`DROP DATABASE IF EXISTS ${name} WITH (FORCE)`))
}

async function asAdmin(adminUrl: string, work: (client: Client) => Promise<unknown>): Promise<void> {
  const client = new Client({ connectionString: adminUrl })
  await client.connect()
  try {
    await work(client)
  } finally {
    await client.end()
  }
}

function withDatabase(address: string, name: string): string {
  const url = new URL(address)
  url.pathname = `/${name}`
  return url.href
}

function withRole(adminUrl: string, role: string): string {
  const url = new URL(adminUrl)
  url.username = role
  url.password = passwordOf(role, adminUrl)
  return url.href
}

/** The same for everybody who knows the superuser's, so that runs on one server do not shut each other out. */
function passwordOf(role: string, adminUrl: string): string {
  return createHash('sha256')
    .update(`${role}:${new URL(adminUrl).password}`)
    .digest('hex')
}

function randomName(): string {
  return randomBytes(6).toString('hex')
}
