import { expect, it } from 'vitest'
import { outlineAreaError } from './outlineAreaError'
import { signedPlaneArea } from './signedPlaneArea'
import type { PlanePoint } from './spatial.types'

const rectangle: PlanePoint[] = [
  [0, 0],
  [200, 0],
  [200, 150],
  [0, 150],
]

/** Park and Miller's generator with the Box–Muller step: a fixed stream of standard normal numbers. */
function normalStream(seed: number): () => number {
  let state = seed
  const uniform = () => {
    state = (state * 48271) % 2147483647
    return state / 2147483647
  }
  return () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform())
}

it('agrees with 20 000 simulated outlines within 2 %', () => {
  const normal = normalStream(7)
  const areas = Array.from({ length: 20_000 }, () =>
    signedPlaneArea(rectangle.map(([x, y]): PlanePoint => [x + 3 * normal(), y + 3 * normal()])),
  )
  const mean = areas.reduce((total, area) => total + area, 0) / areas.length
  const variance = areas.reduce((total, area) => total + (area - mean) ** 2, 0) / (areas.length - 1)

  expect(Math.sqrt(variance) / outlineAreaError(rectangle, 3).standardDeviationM2).toBeCloseTo(1, 1.7)
})

it('is the same for a closed and an open list of corners', () => {
  expect(outlineAreaError([...rectangle, [0, 0]], 3)).toEqual(outlineAreaError(rectangle, 3))
})

it('refuses a negative error and a line', () => {
  expect(() => outlineAreaError(rectangle, -1)).toThrow('parameter-out-of-range')
  expect(() =>
    outlineAreaError(
      [
        [0, 0],
        [1, 1],
      ],
      1,
    ),
  ).toThrow('ring-too-short')
})
