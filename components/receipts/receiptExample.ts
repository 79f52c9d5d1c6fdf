import type { Receipt } from '@/shared/schemas/receipt'
import { exampleRun } from '@/components/runs/runExample'

const ROW = '0191c0de-0000-7000-8000-000000000021'
const LIFE = '0191c0de-0000-7000-8000-000000000022'

/** A receipt of two groups for tests: 12 t of concrete and timber coming down. */
export const exampleReceipt: Receipt = {
  run: exampleRun,
  figure: {
    kind: 'demolition',
    material: 'all',
    fromYear: 2027,
    toYear: 2027,
    use: null,
    structure: null,
    period: null,
    buildingId: null,
  },
  massKg: 12_000,
  band: { p10Kg: 6_000, p90Kg: 24_000 },
  groups: [
    {
      use: 'terraced',
      structure: 'masonry-timber-floors',
      period: 'before-1919',
      buildingCount: 60,
      floorAreaM2: 12_000,
      massKg: 8_000,
      terms: [
        {
          material: 'concrete',
          component: 'structure',
          countedAreaM2: 8,
          contentKgPerM2: 750,
          massKg: 6_000,
          rowIds: [ROW],
        },
        {
          material: 'timber',
          component: 'structure',
          countedAreaM2: 8,
          contentKgPerM2: 250,
          massKg: 2_000,
          rowIds: [],
        },
      ],
      missing: ['gypsum'],
    },
    {
      use: 'office',
      structure: 'reinforced-concrete',
      period: '1961-1975',
      buildingCount: 20,
      floorAreaM2: 8_000,
      massKg: 4_000,
      terms: [
        {
          material: 'concrete',
          component: 'structure',
          countedAreaM2: 4,
          contentKgPerM2: 1_000,
          massKg: 4_000,
          rowIds: [ROW],
        },
      ],
      missing: [],
    },
  ],
  buildings: [],
  factorRows: [
    {
      rowId: ROW,
      material: 'concrete',
      component: 'structure',
      use: 'all',
      structure: 'all',
      period: 'all',
      meanKgPerM2: 800,
      medianKgPerM2: 760,
      sharedCv: 0.2,
      sampleCount: 12,
      source: 'a published table',
      provenance: 'published',
    },
  ],
  lifetimes: [
    {
      lifetimeId: LIFE,
      component: 'building',
      use: 'all',
      structure: 'all',
      model: 'weibull',
      meanYears: 120,
      sdYears: 50,
      isOfScenario: true,
      source: 'common practice',
      provenance: 'common-practice',
    },
  ],
}
