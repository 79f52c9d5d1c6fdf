import { describe, expect, it } from 'vitest'
import { editionRows } from '@/shared/schemas/factorBook'
import { publishedEdition } from './publishedEdition'

describe('the factor book every organisation starts with', () => {
  const edition = publishedEdition()

  it('fits its own schema, with a source and a provenance on every row', () => {
    expect(() => editionRows.parse(edition)).not.toThrow()
    const rows = Object.values(edition).flat()
    expect(rows.filter(({ source }) => source.length < 10)).toEqual([])
  })

  it('gives every row an id of its own, the same at each reading', () => {
    const ids = Object.values(edition)
      .flat()
      .map(({ rowId }) => rowId)
    expect(new Set(ids).size).toBe(ids.length)
    expect(publishedEdition().intensities[0]?.rowId).toBe(edition.intensities[0]?.rowId)
  })

  it('adds up to the published whole-building range of each structure (P10–P90)', () => {
    const range = {
      'reinforced-concrete': [816, 2170],
      'masonry-timber-floors': [784, 2526],
      'timber-frame': [288, 931],
      'steel-frame': [763, 1735],
    } as const
    for (const [structure, [low, high]] of Object.entries(range)) {
      const whole = edition.intensities
        .filter((row) => row.structure === structure && row.use === 'all')
        .reduce((total, row) => total + (row.meanKgPerM2 ?? 0), 0)
      expect(whole, structure).toBeGreaterThan(low)
      expect(whole, structure).toBeLessThan(high)
    }
  })

  it('keeps the 38 entries of chapter 17 of the List of Waste, and no swell factor among the densities', () => {
    expect(edition.wasteCodes).toHaveLength(38)
    expect(edition.densities.every(({ lowKgPerM3 }) => lowKgPerM3 >= 10)).toBe(true)
  })
})
