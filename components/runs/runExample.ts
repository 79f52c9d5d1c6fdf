import type { RunResult, RunSummary } from '@/shared/schemas/run'

const ID = '0191c0de-0000-7000-8000-00000000000'

/** A finished run for tests. */
export const exampleRun: RunSummary = {
  runId: `${ID}1`,
  number: 7,
  state: 'done',
  progressShare: 1,
  failure: null,
  roundId: `${ID}2`,
  roundName: 'Autumn round',
  districtId: `${ID}3`,
  districtName: 'Ropewalk',
  editionId: `${ID}4`,
  editionNumber: 1,
  scenario: {
    name: 'As things stand',
    horizonYears: 2,
    yearOffset: 0.5,
    appliesHazardMultipliers: true,
    hazardMultiplier: 1,
    lifetimeOverrides: [],
  },
  surveyYear: 2026,
  engineVersion: '1.0.0',
  seed: 1,
  inputsSha256: null,
  resultSha256: null,
  createdAt: '2026-11-30T10:00:00.000Z',
  createdByName: 'M. Quill',
}

const band = (meanKg: number) => ({ meanKg, p10Kg: meanKg * 0.8, p50Kg: meanKg, p90Kg: meanKg * 1.25 })
const series = (...meanKg: number[]) => ({
  meanKg,
  p10Kg: meanKg.map((massKg) => massKg / 2),
  p90Kg: meanKg.map((massKg) => massKg * 2),
})

/** Its result: two materials, two years. */
export const exampleResult: RunResult = {
  basis: {
    areaBasis: 'GFA',
    frameCount: 100,
    computedCount: 80,
    inaccessibleCount: 2,
    notABuildingCount: 3,
    clearedCount: 1,
    outstandingCount: 14,
    frameFootprintM2: 10_000,
    computedFootprintM2: 8_500,
    computedFloorAreaM2: 20_000,
    unknownUseCount: 1,
    unknownStructureCount: 4,
    unknownYearCount: 9,
    unknownStoreysCount: 2,
    overdueCount: 1,
    impliedDemolitionRatePerYear: 0.0005,
    impliedRateWarning: 'below-band',
    varianceSharesOfStock: { measurement: 0.2, factor: 0.8, lifetime: 0, chance: 0 },
    varianceSharesOfTenYearFlow: { measurement: 0.1, factor: 0.2, lifetime: 0.3, chance: 0.4 },
  },
  stock: {
    total: band(24_000_000),
    byMaterial: [
      { material: 'concrete', band: band(20_000_000), missingCount: 0, factorRowIds: [], isFromMemory: false },
      { material: 'timber', band: band(4_000_000), missingCount: 4, factorRowIds: [], isFromMemory: true },
    ],
    cells: [
      {
        use: 'terraced',
        structure: 'masonry-timber-floors',
        period: 'before-1919',
        buildingCount: 80,
        floorAreaM2: 20_000,
        massKg: { concrete: 20_000_000, timber: 4_000_000 },
      },
    ],
  },
  yearsAhead: {
    years: [2027, 2028],
    demolition: {
      total: series(12_000, 13_000),
      byMaterial: { concrete: series(10_000, 11_000), timber: series(2_000, 2_000) },
    },
    refurbishment: { total: series(0, 0), byMaterial: {} },
    expectedBuildings: [0.04, 0.05],
    expectedFloorAreaM2: [10, 11],
    cumulative: series(12_000, 25_000),
  },
}
