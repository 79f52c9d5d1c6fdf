import { mkdirSync, mkdtempSync, rmSync, statSync, writeFileSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { fingerprint, isFresh, writeStamp } from './fingerprint.mjs'
import { readSecrets } from './secrets.mjs'
import { hasOwnDatabase, readPort } from './serverSettings.mjs'

const folder = mkdtempSync(path.join(os.tmpdir(), 'tallystone-settings-'))
afterAll(() => rmSync(folder, { recursive: true, force: true }))

describe('the port', () => {
  it('is 8080 unless PORT says otherwise', () => {
    expect(readPort({})).toBe(8080)
    expect(readPort({ PORT: '9000' })).toBe(9000)
  })

  it.each(['', '0', '65536', '80a', '-1', '8e3'])('refuses PORT "%s" by name', (text) => {
    expect(() => readPort({ PORT: text })).toThrow('PORT is')
  })
})

describe('a database of the operator’s own', () => {
  it('is used when both addresses are set', () => {
    expect(hasOwnDatabase({})).toBe(false)
    expect(hasOwnDatabase({ DATABASE_URL: 'postgres://a', DATABASE_OWNER_URL: 'postgres://b' })).toBe(true)
  })

  it('is refused when one of the two is missing, and the missing one is named', () => {
    expect(() => hasOwnDatabase({ DATABASE_URL: 'postgres://a' })).toThrow('DATABASE_OWNER_URL is not')
    expect(() => hasOwnDatabase({ DATABASE_OWNER_URL: 'postgres://b' })).toThrow('DATABASE_URL is not')
  })
})

describe('secrets', () => {
  it('are made once, for their owner’s eyes only, and stay', () => {
    const file = path.join(folder, 'local', 'secrets.json')
    const first = readSecrets(file)

    expect(readSecrets(file)).toEqual(first)
    expect(statSync(file).mode & 0o777).toBe(0o600)
    expect(first.sessionSecret).toMatch(/^[\w-]{43}$/)
    expect(new Set(Object.values(first)).size).toBe(4)
  })

  it('are not replaced when their file is damaged', () => {
    const file = path.join(folder, 'damaged.json')
    writeFileSync(file, '{"ownerPassword": "ab')

    expect(() => readSecrets(file)).toThrow('restore it')
  })
})

describe('the fingerprint of sources', () => {
  it('changes with a name or a content, and not with a test', () => {
    const root = path.join(folder, 'sources')
    mkdirSync(path.join(root, 'shared'), { recursive: true })
    const write = (name: string, text: string) => writeFileSync(path.join(root, 'shared', name), text)
    write('a.ts', 'one')
    const before = fingerprint(root, ['shared', 'missing.json'])

    write('a.test.ts', 'a test')
    expect(fingerprint(root, ['shared'])).toBe(before)
    write('a.ts', 'two')
    expect(fingerprint(root, ['shared'])).not.toBe(before)
    write('a.ts', 'one')
    write('b.ts', '')
    expect(fingerprint(root, ['shared'])).not.toBe(before)
  })

  it('is fresh only against its own stamp', () => {
    const stamp = path.join(folder, 'stamps', 'web')
    expect(isFresh(stamp, 'abc')).toBe(false)

    writeStamp(stamp, 'abc')

    expect(isFresh(stamp, 'abc')).toBe(true)
    expect(isFresh(stamp, 'abd')).toBe(false)
  })
})
