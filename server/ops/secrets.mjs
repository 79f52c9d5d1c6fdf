import { randomBytes } from 'node:crypto'
import { chmodSync, existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs'
import path from 'node:path'

const NAMES = ['superuserPassword', 'ownerPassword', 'appPassword', 'sessionSecret']

/**
 * The generated secrets of one installation, kept in a file only its owner may read. Missing ones are made and added;
 * none is ever changed.
 *
 * @param {string} file e.g. `.local/secrets.json`
 * @returns {{ superuserPassword: string, ownerPassword: string, appPassword: string, sessionSecret: string }}
 * @throws {Error} when the file is there but cannot be read as such
 */
export function readSecrets(file) {
  const known = existsSync(file) ? parse(file) : {}
  const missing = NAMES.filter((name) => typeof known[name] !== 'string')
  if (missing.length === 0) return known
  const secrets = { ...known, ...Object.fromEntries(missing.map((name) => [name, randomSecret()])) }
  mkdirSync(path.dirname(file), { recursive: true })
  const draft = `${file}.${process.pid}`
  writeFileSync(draft, `${JSON.stringify(secrets, null, 2)}\n`, { mode: 0o600 })
  renameSync(draft, file)
  chmodSync(file, 0o600)
  return secrets
}

/** 43 characters that need no quoting in an address. */
function randomSecret() {
  return randomBytes(32).toString('base64url')
}

function parse(file) {
  try {
    const value = JSON.parse(readFileSync(file, 'utf8'))
    if (value !== null && typeof value === 'object') return value
  } catch (error) {
    throw new Error(`${file} cannot be read (${error.message}). It holds the passwords of the database: restore it.`)
  }
  throw new Error(`${file} does not hold secrets. It holds the passwords of the database: restore it.`)
}
