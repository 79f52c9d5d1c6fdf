import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ComputeError } from '@/shared/compute/errors'
import { sum } from '@/shared/compute/sum'
import { shareOutByWalk, type WalkPart } from './shareOutByWalk'
import { walkLength } from './walkLength'

const part = fc.record({
  position: fc.tuple(fc.double({ min: 4.3, max: 4.4, noNaN: true }), fc.double({ min: 52, max: 52.05, noNaN: true })),
  load: fc.integer({ min: 1, max: 40 }),
})

describe('sharing a district out', () => {
  it('puts every part in exactly one beat and leaves none empty', () => {
    fc.assert(
      fc.property(fc.array(part, { minLength: 1, maxLength: 80 }), fc.integer({ min: 1, max: 12 }), (parts, wanted) => {
        const beatCount = Math.min(wanted, parts.length)
        const beats = shareOutByWalk(parts, beatCount)

        expect(beats).toHaveLength(beatCount)
        expect(beats.every((beat) => beat.length > 0)).toBe(true)
        expect(beats.flat().sort((one, other) => one - other)).toEqual(parts.map((_part, index) => index))
      }),
    )
  })

  it('gives beats of equal parts loads that differ by no more than a part a cut', () => {
    const parts: WalkPart[] = Array.from({ length: 240 }, (_one, index) => ({
      position: [4.3 + (index % 20) * 0.001, 52 + Math.floor(index / 20) * 0.0006],
      load: 5,
    }))

    const loads = shareOutByWalk(parts, 6).map((beat) => sum(beat.map((index) => parts[index]?.load ?? 0)))

    expect(Math.max(...loads) - Math.min(...loads)).toBeLessThanOrEqual(15)
  })

  it('cuts a long street across, not along', () => {
    const street: WalkPart[] = Array.from({ length: 40 }, (_one, index) => ({
      position: [4.3 + index * 0.0003, 52 + (index % 2) * 0.0001],
      load: 1,
    }))

    const [west = [], east = []] = shareOutByWalk(street, 2)

    expect(Math.max(...west)).toBeLessThan(Math.min(...east))
  })

  it('is shorter to walk than beats drawn by lot', () => {
    const parts: WalkPart[] = Array.from({ length: 200 }, (_one, index) => ({
      position: [4.3 + ((index * 7919) % 1000) * 1e-5, 52 + ((index * 104729) % 1000) * 1e-5],
      load: 1,
    }))
    const lengthOf = (beats: number[][]) =>
      sum(beats.map((beat) => walkLength(beat.map((index) => parts[index]?.position ?? [0, 0]))))

    const byLot = [0, 1, 2, 3].map((beat) => parts.map((_part, index) => index).filter((index) => index % 4 === beat))

    expect(lengthOf(shareOutByWalk(parts, 4))).toBeLessThan(0.8 * lengthOf(byLot))
  })

  it('refuses more beats than parts, none, and parts without work', () => {
    const codeOf = (parts: readonly WalkPart[], beatCount: number) => {
      try {
        return shareOutByWalk(parts, beatCount)
      } catch (error) {
        return error instanceof ComputeError ? error.code : error
      }
    }
    const one: WalkPart = { position: [0, 0], load: 1 }

    expect(codeOf([one], 2)).toBe('parameter-out-of-range')
    expect(codeOf([one], 0)).toBe('parameter-out-of-range')
    expect(codeOf([{ ...one, load: 0 }], 1)).toBe('negative-amount')
  })
})
