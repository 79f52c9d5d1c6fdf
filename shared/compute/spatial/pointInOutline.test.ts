import { readFileSync } from 'node:fs'
import path from 'node:path'
import fc from 'fast-check'
import { expect, it } from 'vitest'
import { interiorPoint } from './interiorPoint'
import { pointInOutline } from './pointInOutline'
import { pointInRing } from './pointInRing'
import type { Outline, Position, Ring } from './spatial.types'

const withCourtyard: Outline = {
  exterior: [
    [0, 0],
    [6, 0],
    [6, 6],
    [0, 6],
    [0, 0],
  ],
  holes: [
    [
      [1, 1],
      [1, 5],
      [5, 5],
      [5, 1],
      [1, 1],
    ],
  ],
}

it('is outside in a courtyard and inside in the wing', () => {
  expect(pointInOutline([3, 3], withCourtyard)).toBe(false)
  expect(pointInOutline([0.5, 3], withCourtyard)).toBe(true)
  expect(pointInOutline([7, 3], withCourtyard)).toBe(false)
})

it('gives a position on a shared side, off its corners, to exactly one neighbour', () => {
  const coordinate = fc.integer({ min: -50, max: 50 }).map((step) => step / 7)
  const position = fc.tuple(coordinate, coordinate)
  fc.assert(
    fc.property(
      position,
      position,
      position,
      position,
      fc.double({ min: 1e-9, max: 1 - 1e-9, noNaN: true }),
      (a, b, c, d, share) => {
        const cross = (p: Position, q: Position, r: Position) =>
          (q[0] - p[0]) * (r[1] - p[1]) - (q[1] - p[1]) * (r[0] - p[0])
        fc.pre(cross(a, b, c) > 1 && cross(a, b, d) < -1)
        const onSide: Position = [a[0] + share * (b[0] - a[0]), a[1] + share * (b[1] - a[1])]
        const isInFirst = pointInRing(onSide, [a, b, c, a])
        const isInSecond = pointInRing(onSide, [b, a, d, b])

        expect(isInFirst && isInSecond).toBe(false)
        expect(isInFirst || isInSecond || onSide[1] === Math.max(a[1], b[1])).toBe(true)
      },
    ),
  )
})

it('finds a point in the wing of a house around a courtyard', () => {
  expect(pointInOutline(interiorPoint(withCourtyard), withCourtyard)).toBe(true)
})

it('finds a point inside every real outline', () => {
  const file = path.join(import.meta.dirname, '..', '..', '..', 'tests', 'fixtures', 'outlines-real.geojson')
  const { features } = JSON.parse(readFileSync(file, 'utf8')) as { features: { geometry: { coordinates: Ring[] } }[] }
  const missed = features.filter(({ geometry: { coordinates } }) => {
    const outline: Outline = { exterior: coordinates[0] ?? [], holes: coordinates.slice(1) }
    return !pointInOutline(interiorPoint(outline), outline)
  })

  expect(missed).toEqual([])
})

it('refuses an outline that encloses nothing', () => {
  const flat: Ring = [
    [0, 0],
    [1, 0],
    [2, 0],
    [0, 0],
  ]

  expect(() => interiorPoint({ exterior: flat, holes: [] })).toThrow('ring-invalid')
  expect(() => interiorPoint({ exterior: [], holes: [] })).toThrow('ring-too-short')
})
