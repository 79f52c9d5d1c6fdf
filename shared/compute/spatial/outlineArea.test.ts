import fc from 'fast-check'
import { expect, it } from 'vitest'
import { geodesicArea } from './geodesicArea'
import { localPlane } from './localPlane'
import { localPlaneArea } from './localPlaneArea'
import { outlineArea } from './outlineArea'
import type { Position, Ring } from './spatial.types'

/** Star-shaped rings around a position: never crossing themselves. */
const starRing = (maxExtentM: number) =>
  fc
    .record({
      longitude: fc.double({ min: -179.9, max: 179.9, noNaN: true }),
      latitude: fc.double({ min: -60, max: 60, noNaN: true }),
      extentM: fc.double({ min: 10, max: maxExtentM, noNaN: true }),
      reaches: fc.array(fc.double({ min: 0.4, max: 1, noNaN: true }), { minLength: 3, maxLength: 12 }),
    })
    .map(({ longitude, latitude, extentM, reaches }): Ring => {
      const plane = localPlane([longitude, latitude])
      return reaches.map((reach, index): Position => {
        const angle = (2 * Math.PI * index) / reaches.length
        const radius = (extentM / 2) * reach
        return plane.toPosition([radius * Math.cos(angle), radius * Math.sin(angle)])
      })
    })

it('agrees in the local plane with geodesics to 5e-7 up to 10 km and 60 degrees', () => {
  fc.assert(
    fc.property(starRing(10_000), (ring) => {
      const { areaM2 } = geodesicArea(ring)

      // Karney's sums carry about 1e-3 m² of rounding of their own, which shows for small buildings.
      expect(Math.abs(Math.abs(localPlaneArea(ring)) - areaM2)).toBeLessThanOrEqual(5e-7 * areaM2 + 2e-3)
    }),
    { numRuns: 500 },
  )
})

it('measures a building between the two published methods', () => {
  const exterior: Ring = [
    [13.405, 52.52],
    [13.4053106, 52.5200578],
    [13.4052588, 52.5201609],
    [13.4049482, 52.5201031],
    [13.405, 52.52],
  ]

  expect(outlineArea({ exterior, holes: [] })).toBeCloseTo(264.497281, 4)
})

it('takes a courtyard off, whatever its sense of rotation', () => {
  const plane = localPlane([5, 52])
  const square = (half: number): Ring =>
    [
      [-half, -half],
      [half, -half],
      [half, half],
      [-half, half],
    ].map(([x = 0, y = 0]) => plane.toPosition([x, y]))
  const inner = square(5)

  expect(outlineArea({ exterior: square(10), holes: [inner] })).toBeCloseTo(300, 4)
  expect(outlineArea({ exterior: square(10), holes: [[...inner].reverse()] })).toBeCloseTo(300, 4)
})

it('uses geodesics where a plane would fail: across the 180 degree meridian, at a pole, for a country', () => {
  const fiji: Ring = [
    [179.9, -17.1],
    [-179.9, -17.1],
    [-179.9, -17],
    [179.9, -17],
  ]
  const pole: Ring = [
    [0, 89],
    [90, 89],
    [180, 89],
    [270, 89],
  ]

  expect(outlineArea({ exterior: fiji, holes: [] })).toBeCloseTo(235632874.13, 1)
  expect(outlineArea({ exterior: pole, holes: [] })).toBeCloseTo(24952305678, -1)
})

it('refuses a ring of two corners', () => {
  const exterior: Ring = [
    [0, 0],
    [1, 1],
    [0, 0],
  ]

  expect(() => outlineArea({ exterior, holes: [] })).toThrow('ring-too-short')
})
