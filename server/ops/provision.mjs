import { runSql } from './postgres.mjs'

export const OWNER_ROLE = 'tallystone_owner'
export const APP_ROLE = 'tallystone_app'

/**
 * Makes the two roles, with these passwords. `tallystone_owner` owns the tables and serves no request;
 * `tallystone_app` serves requests, owns nothing and cannot pass row-level security. May be run again.
 *
 * @param {string} bin folder of PostgreSQL's programs
 * @param {string} adminUrl a superuser's address
 */
export async function provisionRoles(bin, adminUrl, { ownerPassword, appPassword }) {
  await runSql(
    bin,
    adminUrl,
    [
      [OWNER_ROLE, ownerPassword],
      [APP_ROLE, appPassword],
    ]
      .map(
        ([role, password]) => `
          DO $$ BEGIN CREATE ROLE ${role}; EXCEPTION WHEN duplicate_object OR unique_violation THEN NULL; END $$;
          ALTER ROLE ${role} LOGIN NOSUPERUSER NOBYPASSRLS NOCREATEDB NOCREATEROLE NOREPLICATION
            PASSWORD ${quote(password)};`,
      )
      .join('\n'),
  )
}

/**
 * Makes a database of the owner's with PostGIS in it, if it is not there. May be run again.
 *
 * @param {string} adminUrl a superuser's address, of any database of the cluster
 */
export async function provisionDatabase(bin, adminUrl, name) {
  const there = await runSql(bin, adminUrl, `SELECT count(*) FROM pg_database WHERE datname = ${quote(name)}`)
  if (there.trim() === '0') await runSql(bin, adminUrl, `CREATE DATABASE ${name} OWNER ${OWNER_ROLE}`)
  const url = new URL(adminUrl)
  url.pathname = `/${name}`
  await runSql(
    bin,
    url.href,
    `REVOKE ALL ON DATABASE ${name} FROM PUBLIC;
     GRANT CONNECT ON DATABASE ${name} TO ${APP_ROLE};
     REVOKE CREATE ON SCHEMA public FROM PUBLIC;
     CREATE EXTENSION IF NOT EXISTS postgis;`,
  )
}

function quote(text) {
  return `'${text.replaceAll("'", "''")}'`
}
