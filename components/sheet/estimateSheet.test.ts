import { describe, expect, it } from 'vitest'
import type { EditionForDevice, IntensityRow } from '@/shared/schemas/factorBook'
import type { SheetAnswers } from '@/shared/schemas/sheet'
import { estimateSheet } from './estimateSheet'

const house: SheetAnswers = {
  footprint: { footprintM2: 100, knownBy: 'measured' },
  storeys: { aboveGround: 2, knownBy: 'measured' },
  structure: { structure: 'steel-frame', knownBy: 'seen' },
  use: { use: 'office', knownBy: 'seen' },
  constructionYear: { kind: 'exact', year: 1970, knownBy: 'told' },
}

function row(changes: Partial<IntensityRow>): IntensityRow {
  return {
    rowId: '01980000-0000-7000-8000-000000000001',
    figureId: '01980000-0000-7000-8000-000000000002',
    structure: 'all',
    use: 'all',
    period: 'all',
    region: 'all',
    material: 'steel',
    component: 'whole',
    areaBasis: 'GFA',
    medianKgPerM2: null,
    meanKgPerM2: 50,
    p10KgPerM2: null,
    p90KgPerM2: null,
    gsdBetweenBuildings: null,
    sharedCv: 0.3,
    sampleCount: null,
    source: 'test',
    provenance: 'common-practice',
    note: null,
    ...changes,
  }
}

function edition(...intensities: IntensityRow[]): EditionForDevice {
  const head = { number: 1, name: 'test', state: 'issued' as const, issuedAt: null, issuedByName: null }
  return { editionId: '01980000-0000-7000-8000-000000000003', ...head, intensities, suspicions: [] }
}

describe('estimateSheet', () => {
  it('is gross floor area times intensity, with a range around it', () => {
    const estimate = estimateSheet(house, edition(row({})))

    expect(estimate?.massKg).toBe(10_000)
    expect(estimate?.lowKg).toBeLessThan(10_000)
    expect(estimate?.highKg).toBeGreaterThan(10_000)
    expect(estimate?.narrowedBy).toBeNull()
  })

  it('names the missing answer by which the book makes a difference, and no other', () => {
    const unknown: SheetAnswers = {
      ...house,
      structure: { structure: 'unknown' },
      constructionYear: { kind: 'unknown' },
    }
    const byStructure = edition(row({ structure: 'steel-frame' }), row({ structure: 'earth', meanKgPerM2: 1 }))

    expect(estimateSheet(unknown, byStructure)?.narrowedBy).toBe('structure')
    expect(estimateSheet({ ...house, constructionYear: { kind: 'unknown' } }, byStructure)?.narrowedBy).toBeNull()
  })

  it('says nothing without a footprint or where nothing stands', () => {
    expect(estimateSheet({}, edition(row({})))).toBeNull()
    expect(estimateSheet({ ...house, finding: { kind: 'cleared', clearedYear: null } }, edition(row({})))).toBeNull()
  })

  it('tallies each use and each part with its own factor', () => {
    const book = edition(row({ use: 'office' }), row({ use: 'retail', meanKgPerM2: 100 }))
    const shared: SheetAnswers = { ...house, use: { use: 'office', otherUses: [{ use: 'retail', share: 0.25 }] } }

    // 200 m²: 150 × 50 and 50 × 100
    expect(estimateSheet(shared, book)?.massKg).toBe(12_500)
  })

  it('asks for the storeys where they are only guessed and the rest is known', () => {
    const guessed: SheetAnswers = { ...house, storeys: { aboveGround: 2, knownBy: 'guessed' } }

    expect(estimateSheet(guessed, edition(row({})))?.narrowedBy).toBe('storeys')
  })
})
