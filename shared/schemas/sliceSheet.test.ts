import { describe, expect, it } from 'vitest'
import { deriveSheet } from './deriveSheet'
import { sheetAnswers, sheetReadyForBag, type BuildingPart, type SheetAnswers } from './sheet'
import { sliceSheet } from './sliceSheet'

const house: SheetAnswers = {
  finding: { kind: 'standing' },
  footprint: { footprintM2: 200, knownBy: 'measured' },
  storeys: { aboveGround: 3, knownBy: 'measured' },
  structure: { structure: 'masonry-timber-floors', knownBy: 'seen' },
  use: { use: 'multi-family', knownBy: 'seen' },
  constructionYear: { kind: 'exact', year: 1905, knownBy: 'told' },
}

const extension: BuildingPart = {
  name: 'rear wing',
  footprintM2: 50,
  aboveGround: 1,
  use: null,
  structure: 'steel-frame',
  constructionYear: { kind: 'between', fromYear: 1970, toYear: 1979, knownBy: 'guessed' },
}

describe('sliceSheet', () => {
  it('is one slice, the whole building, for a sheet with one use and no parts', () => {
    expect(sliceSheet(house)).toEqual([
      { use: 'multi-family', structure: 'masonry-timber-floors', yearFrom: 1905, yearTo: 1905, grossFloorAreaM2: 600 },
    ])
  })

  it('takes the footprint of a part out of the main part, and gives the part its own storeys, age and structure', () => {
    const answers = { ...house, parts: { parts: [extension], knownBy: 'seen' as const } }

    expect(sliceSheet(answers).map(({ grossFloorAreaM2 }) => grossFloorAreaM2)).toEqual([450, 50])
    expect(sliceSheet(answers)[1]).toEqual({
      use: 'multi-family',
      structure: 'steel-frame',
      yearFrom: 1970,
      yearTo: 1979,
      grossFloorAreaM2: 50,
    })
    expect(deriveSheet(answers).grossFloorAreaM2).toBe(500)
    // (450·0.02)² + (50·0.065)², out of 500
    expect(deriveSheet(answers).floorAreaCv).toBeCloseTo(Math.sqrt(9 ** 2 + 3.25 ** 2) / 500, 12)
  })

  it('shares the main part out by uses, and the slices add up to the building', () => {
    const otherUses = [
      { use: 'retail' as const, share: 0.3 },
      { use: 'office' as const, share: 0.2 },
    ]
    const answers = { ...house, use: { use: 'multi-family' as const, otherUses }, parts: { parts: [extension] } }
    const slices = sliceSheet(answers)

    expect(slices.map(({ use }) => use)).toEqual(['multi-family', 'retail', 'office', 'multi-family'])
    expect(slices.reduce((sum, { grossFloorAreaM2 }) => sum + grossFloorAreaM2, 0)).toBeCloseTo(500, 9)
  })

  it('has no slice where nothing stands', () => {
    expect(sliceSheet({ ...house, finding: { kind: 'cleared', clearedYear: 2020 } })).toEqual([])
  })
})

describe('sheetAnswers', () => {
  it('reads a sheet that was stored before parts, shares and marks existed', () => {
    expect(sheetAnswers.parse(house)).toEqual(house)
  })

  it('refuses other uses that leave nothing to the main use', () => {
    const otherUses = [
      { use: 'retail', share: 0.6 },
      { use: 'office', share: 0.4 },
    ]

    expect(sheetAnswers.safeParse({ use: { use: 'hotel', otherUses } }).success).toBe(false)
  })

  it('is not ready for the bag with parts larger than the whole', () => {
    const parts = { parts: [{ ...extension, footprintM2: 201 }] }
    const problem = sheetReadyForBag.safeParse({ ...house, parts }).error

    expect(problem?.issues.map(({ path, message }) => [path[0], message])).toEqual([['parts', 'larger-than-the-whole']])
  })
})
