import fc from 'fast-check'
import { expect, it } from 'vitest'
import { convexHull } from './convexHull'
import { ringOrientation } from './ringOrientation'

const positions = fc.array(fc.tuple(fc.integer({ min: -50, max: 50 }), fc.integer({ min: -50, max: 50 })), {
  minLength: 4,
  maxLength: 40,
})

it('leaves no position outside and never turns right', () => {
  fc.assert(
    fc.property(positions, (given) => {
      const [a = [0, 0], b = [0, 0]] = given
      fc.pre(given.some(([x, y]) => (b[0] - a[0]) * (y - a[1]) !== (b[1] - a[1]) * (x - a[0])))
      const hull = convexHull(given)

      expect(ringOrientation(hull)).toBe('counter-clockwise')
      hull.slice(1).forEach(([toX, toY], index) => {
        const [fromX, fromY] = hull[index] ?? [0, 0]
        const rightOf = given.filter(([x, y]) => (toX - fromX) * (y - fromY) - (toY - fromY) * (x - fromX) < 0)
        expect(rightOf).toEqual([])
      })
    }),
  )
})

it('goes the short way across the 180 degree meridian', () => {
  const hull = convexHull([
    [179, 0],
    [-179, 0],
    [-179, 1],
    [179, 1],
    [180, 0.5],
  ])

  expect(hull).toEqual([
    [179, 0],
    [-179, 0],
    [-179, 1],
    [179, 1],
    [179, 0],
  ])
})

it('refuses positions in one line', () => {
  expect(() =>
    convexHull([
      [0, 0],
      [1, 1],
      [2, 2],
    ]),
  ).toThrow('ring-too-short')
  expect(() => convexHull([])).toThrow('ring-too-short')
})
