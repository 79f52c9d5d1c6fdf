import fc from 'fast-check'
import { expect, it } from 'vitest'
import { hexagonAreaM2 } from './hexagonAreaM2'
import { hexagonCell } from './hexagonCell'
import { hexagonCentre } from './hexagonCentre'
import { hexagonRing } from './hexagonRing'
import { signedPlaneArea } from './signedPlaneArea'

const metres = fc.double({ min: -5000, max: 5000, noNaN: true })
const size = fc.double({ min: 1, max: 500, noNaN: true })
const neighbours = [
  [1, 0],
  [0, 1],
  [-1, 1],
  [-1, 0],
  [0, -1],
  [1, -1],
] as const

it('puts each point into the hexagon with the nearest centre', () => {
  fc.assert(
    fc.property(metres, metres, size, (xM, yM, s) => {
      const cell = hexagonCell([xM, yM], s)
      const distance = (q: number, r: number) => {
        const [x, y] = hexagonCentre({ q, r }, s)
        return Math.hypot(x - xM, y - yM)
      }
      const own = distance(cell.q, cell.r)

      expect(own).toBeLessThanOrEqual(s * (1 + 1e-9))
      for (const [q, r] of neighbours) expect(own).toBeLessThanOrEqual(distance(cell.q + q, cell.r + r) + 1e-6)
    }),
  )
})

it('finds a cell by its own centre', () => {
  fc.assert(
    fc.property(fc.integer({ min: -99, max: 99 }), fc.integer({ min: -99, max: 99 }), size, (q, r, s) => {
      expect(hexagonCell(hexagonCentre({ q, r }, s), s)).toEqual({ q, r })
    }),
  )
})

it('draws a ring of the area it states', () => {
  expect(signedPlaneArea(hexagonRing({ q: 2, r: -1 }, 50))).toBeCloseTo(hexagonAreaM2(50), 8)
})

it('refuses a grid without size', () => {
  expect(() => hexagonCell([0, 0], 0)).toThrow('parameter-not-positive')
  expect(() => hexagonCell([Number.NaN, 0], 1)).toThrow('not-a-number')
})
