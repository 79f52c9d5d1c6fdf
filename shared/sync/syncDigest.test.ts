import { createHash } from 'node:crypto'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { syncDigest } from './syncDigest'

const entry = fc.record({ id: fc.uuid(), change: fc.nat(Number.MAX_SAFE_INTEGER) })

describe('digest of what a device holds', () => {
  it('L6 is the XOR of the first 64 bits of SHA-256, as any other implementation computes it', () => {
    fc.assert(
      fc.property(fc.array(entry, { maxLength: 20 }), (entries) => {
        const xor = entries.reduce((sum, { id, change }) => {
          return sum ^ createHash('sha256').update(`${id}:${change}`).digest().readBigUInt64BE(0)
        }, 0n)

        expect(syncDigest(entries)).toEqual({ count: entries.length, xor64: xor.toString(16).padStart(16, '0') })
      }),
    )
  })

  it('L6 does not depend on the order, and an entry given twice cancels itself', () => {
    const [one, two] = [
      { id: '019a0000-0000-7000-8000-000000000001', change: 4 },
      { id: '019a0000-0000-7000-8000-000000000002', change: 5 },
    ]

    expect(syncDigest([one, two])).toEqual(syncDigest([two, one]))
    expect(syncDigest([one, two, two]).xor64).toBe(syncDigest([one]).xor64)
    expect(syncDigest([])).toEqual({ count: 0, xor64: '0000000000000000' })
    expect(syncDigest([{ ...one, change: 5 }]).xor64).not.toBe(syncDigest([one]).xor64)
  })

  it('refuses an entry that does not fit one block', () => {
    expect(() => syncDigest([{ id: 'x'.repeat(54), change: 1 }])).toThrow(RangeError)
  })
})
