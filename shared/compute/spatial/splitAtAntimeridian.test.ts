import { expect, it } from 'vitest'
import { geodesicArea } from './geodesicArea'
import type { Ring } from './spatial.types'
import { splitAtAntimeridian } from './splitAtAntimeridian'

const across: Ring = [
  [179.99, -17.1],
  [-179.99, -17.1],
  [-179.99, -17.05],
  [179.99, -17.05],
  [179.99, -17.1],
]

it('keeps the area and leaves no part across the meridian', () => {
  const parts = splitAtAntimeridian(across)
  const total = parts.reduce((areaM2, part) => areaM2 + geodesicArea(part).areaM2, 0)

  expect(parts).toHaveLength(2)
  expect(total / geodesicArea(across).areaM2).toBeCloseTo(1, 6)
  for (const part of parts) {
    const longitudes = part.map(([longitude]) => longitude)
    expect(Math.max(...longitudes) - Math.min(...longitudes)).toBeLessThan(1)
  }
})

it('works the same from the other side', () => {
  const fromEast: Ring = [...across.slice(1, -1), across[0] ?? [0, 0], across[1] ?? [0, 0]]

  expect(splitAtAntimeridian(fromEast)).toHaveLength(2)
})

it('returns a ring elsewhere unharmed', () => {
  const ring: Ring = [
    [4, 52],
    [5, 52],
    [5, 53],
    [4, 52],
  ]

  expect(splitAtAntimeridian(ring)).toEqual([ring])
})
