import { expect, it } from 'vitest'
import type { DeviceLook } from '@/shared/schemas/nextLook'
import { lookShades } from './lookShade'

it('shades the first tenth of the list most, down to two fifths less, the rest least', () => {
  const looks = Array.from({ length: 20 }, (_, place): DeviceLook => ({
    buildingId: String(place),
    rank: place + 1,
    settleShare: 0.01,
    reason: { narrows: 'use', isLarge: false },
    isRecorded: false,
  }))
  const counts = new Map<string, number>()
  for (const shade of lookShades(looks).values()) counts.set(shade, (counts.get(shade) ?? 0) + 1)

  expect([...counts]).toEqual([
    ['shadeFirst', 2],
    ['shadeThen', 6],
    ['shadeLast', 12],
  ])
  expect(lookShades([]).size).toBe(0)
})
