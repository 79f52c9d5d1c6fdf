import fc from 'fast-check'
import { expect, it } from 'vitest'
import { ringCrossing } from './ringCrossing'
import type { Position } from './spatial.types'

const corners = fc.uniqueArray(fc.tuple(fc.integer({ min: 0, max: 9 }), fc.integer({ min: 0, max: 9 })), {
  minLength: 3,
  maxLength: 8,
  selector: ([x, y]) => `${x} ${y}`,
})

/** All pairs of sides, by the textbook test: the sweep must find the same. */
function crossesSlowly(ring: readonly Position[]): boolean {
  const turn = (a: Position, b: Position, c: Position) =>
    Math.sign((b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]))
  const isOn = (a: Position, b: Position, p: Position) =>
    turn(a, b, p) === 0 &&
    Math.min(a[0], b[0]) <= p[0] &&
    p[0] <= Math.max(a[0], b[0]) &&
    Math.min(a[1], b[1]) <= p[1] &&
    p[1] <= Math.max(a[1], b[1])
  const at = (index: number): Position => ring[index % ring.length] ?? [0, 0]
  const meets = (i: number, j: number): boolean => {
    const [a, b, c, d] = [at(i), at(i + 1), at(j), at(j + 1)]
    if (j === i + 1) return isOn(a, b, d) || isOn(c, d, a)
    if (i === 0 && j === ring.length - 1) return isOn(c, d, b) || isOn(a, b, c)
    const isProper = turn(a, b, c) * turn(a, b, d) < 0 && turn(c, d, a) * turn(c, d, b) < 0
    return isProper || [c, d].some((end) => isOn(a, b, end)) || [a, b].some((end) => isOn(c, d, end))
  }
  return ring.some((_, i) => ring.some((__, j) => j > i && meets(i, j)))
}

it('finds what comparing all pairs of sides finds', () => {
  fc.assert(
    fc.property(corners, (ring) => {
      expect(ringCrossing(ring) !== undefined).toBe(crossesSlowly(ring))
    }),
    { numRuns: 2000 },
  )
})

it('does not depend on the start or the sense of rotation', () => {
  fc.assert(
    fc.property(corners, fc.nat({ max: 7 }), (ring, shift) => {
      const turned = [...ring.slice(shift % ring.length), ...ring.slice(0, shift % ring.length)]
      const isCrossing = ringCrossing(ring) !== undefined

      expect(ringCrossing(turned) !== undefined).toBe(isCrossing)
      expect(ringCrossing([...ring].reverse()) !== undefined).toBe(isCrossing)
    }),
  )
})

it('sees a ring that touches itself in a corner', () => {
  expect(
    ringCrossing([
      [0, 0],
      [4, 0],
      [2, 2],
      [4, 4],
      [0, 4],
      [2, 2],
    ]),
  ).toBeDefined()
})

it('checks a ring of 5 000 corners in well under a second', () => {
  const ring = Array.from({ length: 5000 }, (_, index): Position => {
    const angle = (2 * Math.PI * index) / 5000
    return [Math.round(1e6 * Math.cos(angle)), Math.round(1e6 * Math.sin(angle))]
  })

  const start = performance.now()
  expect(ringCrossing(ring)).toBeUndefined()
  expect(performance.now() - start).toBeLessThan(1000)
})
