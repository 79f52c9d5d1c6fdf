import { describe, expect, it } from 'vitest'
import { MATERIALS } from '@/shared/compute/factors/vocabulary'
import { MATERIAL_HATCHES } from './materialHatches'

const linesOf = (material: (typeof MATERIALS)[number]): string => {
  const { full } = MATERIAL_HATCHES[material]
  return JSON.stringify([full.widthPx, full.heightPx, full.strokes, full.fills])
}

describe('MATERIAL_HATCHES', () => {
  it('draws every material by lines of its own, so that they differ in black and white', () => {
    expect(new Set(MATERIALS.map(linesOf)).size).toBe(MATERIALS.length)
  })

  it('gives every material a ground of its own', () => {
    expect(new Set(MATERIALS.map((material) => MATERIAL_HATCHES[material].ground)).size).toBe(MATERIALS.length)
  })

  it.each(MATERIALS)('draws something on the tiles of %s', (material) => {
    const { full, calm } = MATERIAL_HATCHES[material]

    for (const { strokes, fills } of [full, calm]) expect(strokes.length + fills.length).toBeGreaterThan(0)
  })
})
