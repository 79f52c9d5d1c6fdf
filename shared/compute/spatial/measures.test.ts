import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { curvatureRadii } from './curvatureRadii'
import { geodesicArea } from './geodesicArea'
import { geodesicDistance } from './geodesicDistance'
import { longitudeDifference } from './longitudeDifference'
import { openRing } from './openRing'
import { planeCentroid } from './planeCentroid'
import { ringOrientation } from './ringOrientation'
import { signedPlaneArea } from './signedPlaneArea'
import type { PlanePoint, Position } from './spatial.types'

const position: fc.Arbitrary<Position> = fc.tuple(
  fc.double({ min: -180, max: 180, noNaN: true }),
  fc.double({ min: -89, max: 89, noNaN: true }),
)
const triangle = fc.array(fc.tuple(fc.integer({ min: -999, max: 999 }), fc.integer({ min: -999, max: 999 })), {
  minLength: 3,
  maxLength: 3,
})

describe('a geodesic distance', () => {
  it('is the same both ways and zero from a place to itself', () => {
    fc.assert(
      fc.property(position, position, (one, other) => {
        const there = geodesicDistance(one, other).distanceM

        expect(geodesicDistance(other, one).distanceM).toBeCloseTo(there, 5)
        expect(geodesicDistance(one, one).distanceM).toBe(0)
      }),
    )
  })

  it('refuses what is no place', () => {
    expect(() => geodesicDistance([0, 91], [0, 0])).toThrow('coordinates-out-of-range')
    expect(() => geodesicDistance([0, 0], [Number.NaN, 0])).toThrow('not-a-number')
  })
})

describe('a geodesic area', () => {
  it('does not depend on closure, start or sense of rotation', () => {
    const corners: Position[] = [
      [4.36, 52.01],
      [4.37, 52.01],
      [4.37, 52.02],
    ]
    const [first = [0, 0] as const, ...rest] = corners
    const { areaM2, orientation } = geodesicArea(corners)

    expect(geodesicArea([...corners, first]).areaM2).toBe(areaM2)
    expect(geodesicArea([...rest, first]).areaM2).toBeCloseTo(areaM2, 2)
    expect(geodesicArea([...corners].reverse())).toMatchObject({ orientation: 'clockwise' })
    expect(orientation).toBe('counter-clockwise')
  })

  it('refuses what is no ring on Earth', () => {
    expect(() =>
      geodesicArea([
        [0, 0],
        [1, 95],
        [2, 0],
      ]),
    ).toThrow('coordinates-out-of-range')
    expect(() =>
      geodesicArea([
        [0, 0],
        [1, Number.NaN],
        [2, 0],
      ]),
    ).toThrow('not-a-number')
    expect(() => geodesicArea([])).toThrow('ring-too-short')
  })
})

describe('a plane polygon', () => {
  it('changes the sign of its area with its sense of rotation, and nothing when moved', () => {
    fc.assert(
      fc.property(triangle, fc.integer({ min: -9999, max: 9999 }), (corners, shift) => {
        const moved = corners.map(([x, y]): PlanePoint => [x + shift, y - shift])
        const area = signedPlaneArea(corners)

        expect(signedPlaneArea([...corners].reverse())).toBeCloseTo(-area, 9)
        expect(signedPlaneArea(moved)).toBeCloseTo(area, 9)
      }),
    )
  })

  it('moves its centroid with itself', () => {
    fc.assert(
      fc.property(triangle, fc.integer({ min: -999, max: 999 }), (corners, shift) => {
        const [x, y] = planeCentroid(corners)
        const [movedX, movedY] = planeCentroid(corners.map(([cx, cy]): PlanePoint => [cx + shift, cy + 2 * shift]))

        expect(movedX - x).toBeCloseTo(shift, 6)
        expect(movedY - y).toBeCloseTo(2 * shift, 6)
      }),
    )
  })

  it('of no corners has no area', () => {
    expect(signedPlaneArea([])).toBe(0)
    expect(planeCentroid([])).toEqual([0, 0])
  })
})

it('keeps the short way round between any two meridians', () => {
  fc.assert(
    fc.property(fc.integer({ min: -720, max: 720 }), fc.integer({ min: -720, max: 720 }), (from, to) => {
      const difference = longitudeDifference(from, to)

      expect(difference).toBeGreaterThanOrEqual(-180)
      expect(difference).toBeLessThan(180)
      expect(Math.abs((to - from - difference) % 360)).toBe(0)
    }),
  )
})

it('gives the published radii of the ellipsoid', () => {
  expect(curvatureRadii(0).meridionalM).toBeCloseTo(6335439.327, 3)
  expect(curvatureRadii(45).primeVerticalM).toBeCloseTo(6388838.29, 2)
  expect(curvatureRadii(90).primeVerticalM).toBeCloseTo(curvatureRadii(-90).meridionalM, 6)
})

it('opens rings of one corner and none', () => {
  expect(openRing([])).toEqual([])
  expect(
    openRing([
      [1, 1],
      [1, 1],
      [1, 1],
    ]),
  ).toEqual([[1, 1]])
})

it('says when a ring has no sense of rotation', () => {
  expect(
    ringOrientation([
      [0, 0],
      [1, 0],
      [2, 0],
      [0, 0],
    ]),
  ).toBe('none')
  expect(
    ringOrientation([
      [179, 0],
      [-179, 0],
      [-179, 1],
      [179, 0],
    ]),
  ).toBe('counter-clockwise')
})
