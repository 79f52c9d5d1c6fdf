import fc from 'fast-check'
import { expect, it } from 'vitest'
import { geodesicDistance } from './geodesicDistance'
import { localPlane } from './localPlane'

const origin = fc.tuple(fc.double({ min: -180, max: 180, noNaN: true }), fc.double({ min: -70, max: 70, noNaN: true }))
const metres = fc.double({ min: -5000, max: 5000, noNaN: true })

it('comes back to the same point within a micrometre', () => {
  fc.assert(
    fc.property(origin, metres, metres, (place, xM, yM) => {
      const plane = localPlane(place)
      const [backX, backY] = plane.toPlane(plane.toPosition([xM, yM]))

      expect(Math.hypot(backX - xM, backY - yM)).toBeLessThan(1e-6)
    }),
  )
})

it('keeps distances from the origin to 1e-6 within 7 km, up to 60° of latitude', () => {
  const upTo60 = fc.tuple(
    fc.double({ min: -180, max: 180, noNaN: true }),
    fc.double({ min: -60, max: 60, noNaN: true }),
  )
  fc.assert(
    fc.property(upTo60, metres, metres, (place, xM, yM) => {
      const position = localPlane(place).toPosition([xM, yM])
      const { distanceM } = geodesicDistance(place, position)

      expect(Math.abs(Math.hypot(xM, yM) - distanceM)).toBeLessThanOrEqual(1e-6 * distanceM + 1e-6)
    }),
  )
})

it('refuses a pole and what is no number', () => {
  expect(() => localPlane([0, 90])).toThrow('coordinates-out-of-range')
  expect(() => localPlane([Number.NaN, 0])).toThrow('coordinates-out-of-range')
  expect(() => localPlane([0, Number.NaN])).toThrow('coordinates-out-of-range')
})
