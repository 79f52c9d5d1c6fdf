import { createHash } from 'node:crypto'
import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import path from 'node:path'

/**
 * A digest of the names and contents of files and folders, tests left out.
 *
 * @param {string} root
 * @param {readonly string[]} inputs relative to root; missing ones count as missing
 */
export function fingerprint(root, inputs) {
  const digest = createHash('sha256')
  for (const name of inputs.flatMap((input) => listFiles(root, input)).sort()) {
    digest
      .update(`${name}\0`)
      .update(readFileSync(path.join(root, name)))
      .update('\0')
  }
  return digest.digest('hex')
}

/** Whether a stamp says what was made came from just these inputs. */
export function isFresh(stampFile, print) {
  return existsSync(stampFile) && readFileSync(stampFile, 'utf8').trim() === print
}

export function writeStamp(stampFile, print) {
  mkdirSync(path.dirname(stampFile), { recursive: true })
  writeFileSync(stampFile, `${print}\n`)
}

function listFiles(root, name) {
  const full = path.join(root, name)
  if (!existsSync(full)) return []
  if (statSync(full).isFile()) return isTest(name) ? [] : [name]
  return readdirSync(full)
    .filter((entry) => !entry.startsWith('.'))
    .flatMap((entry) => listFiles(root, path.join(name, entry)))
}

function isTest(name) {
  return /\.test\.tsx?$/.test(name)
}
