import { describe, expect, it } from 'vitest'
import { judgeMutation } from './judgeMutation'

const ID = '019a0000-0000-7000-8000-000000000001'
const good = {
  id: ID,
  seq: 1,
  op: 'set',
  type: 'sheet',
  entity: ID,
  seen: 0,
  at: '2026-11-30T10:12:03+01:00',
  elapsedMs: 5,
  set: { storeys: { aboveGround: 2.5, knownBy: 'seen' } },
}
const parsed = (text: string) => JSON.parse(text) as object
const withSet = (json: string) => parsed(JSON.stringify({ ...good, set: 'SET' }).replace('"SET"', json))

describe('judging one mutation', () => {
  it('takes what is right, and gives the same fingerprint under another number', () => {
    const judged = judgeMutation(good)

    expect(judged).toMatchObject({ isUsable: true, mutation: good })
    expect(judgeMutation({ ...good, seq: 9 }).fingerprint).toBe(judged.fingerprint)
    expect(judgeMutation({ ...good, seen: 9 }).fingerprint).not.toBe(judged.fingerprint)
  })

  it.each([
    ['deeper than six levels', withSet('{"notes":{"text":{"a":{"b":{"c":{"d":1}}}}}}')],
    ['10,000 levels deep', withSet(`${'{"a":'.repeat(10_000)}1${'}'.repeat(10_000)}`)],
    ['of very many keys', { ...good, set: Object.fromEntries(Array.from({ length: 3_000 }, (_, i) => [`k${i}`, 1])) }],
    ['with __proto__', withSet('{"__proto__":{"isSteward":true}}')],
    ['with constructor', withSet('{"use":{"constructor":{"prototype":{"x":1}}}}')],
    ['with NUL in a text', withSet('{"suspicions":{"seen":["a\\u0000b"]}}')],
    ['with half of a surrogate pair', withSet('{"notes":{"text":"\\ud800"}}')],
    ['with half of a surrogate pair in a key', withSet('{"\\udc00":1}')],
  ])('P6 does not read one %s', (_kind, payload) => {
    const judged = judgeMutation(payload)

    expect(judged).toMatchObject({ isUsable: false, fingerprint: null, unusable: { code: 'mutation-not-readable' } })
    expect(Object.prototype).not.toHaveProperty('isSteward')
  })

  it('P6 does not take one above 64 KiB, counted in bytes', () => {
    const notes = (text: string) => judgeMutation({ ...good, set: { notes: { text } } })

    expect(notes('€'.repeat(22_000))).toMatchObject({ isUsable: false, unusable: { code: 'mutation-too-large' } })
    expect(notes('€'.repeat(4_000))).toMatchObject({ isUsable: true })
  })

  it.each([
    ['organisation_id', { organisation_id: ID }, '/'],
    ['change_no', { change_no: 1 }, '/'],
    ['state', { set: { state: 'checked' } }, '/set'],
    ['recordedBy', { set: { recordedBy: ID } }, '/set'],
    ['role', { role: 'steward' }, '/'],
  ])('M1 names the field %s as one that is not to be written', (field, extra, pointer) => {
    const judged = judgeMutation({ ...good, ...extra })

    expect(judged).toMatchObject({
      isUsable: false,
      unusable: { code: 'mutation-not-usable', faults: [{ pointer, code: 'unrecognized_keys' }] },
    })
    expect(judged.isUsable ? '' : judged.unusable.faults[0]?.detail).toContain(field)
  })

  it('P6 names every value that cannot be used, with its place', () => {
    const judged = judgeMutation({
      ...good,
      seen: -1,
      set: { storeys: { aboveGround: 2.3 }, footprint: { footprintM2: Infinity, knownBy: 'seen' } },
    })

    expect(judged.isUsable ? [] : judged.unusable.faults.map(({ pointer }) => pointer)).toEqual([
      '/seen',
      '/set/storeys/aboveGround',
      '/set/footprint/footprintM2',
    ])
  })

  it.each([
    ['an unknown act', { op: 'drop' }],
    ['an unknown thing', { type: 'person' }],
    ['no act', { op: undefined }],
    ['a conflict that is deleted', { op: 'delete', type: 'conflict', set: undefined }],
  ])('P6 does not take %s', (_kind, change) => {
    expect(judgeMutation({ ...good, ...change })).toMatchObject({ isUsable: false })
  })
})
