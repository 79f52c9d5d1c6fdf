import type { Structure, Use } from '@/shared/compute/factors/vocabulary'
import { chance, choose, wholeBetween } from './draw'
import type { Random, TownBuilding } from './town.types'
import type { DistrictName } from './townNames'

type Place = Pick<TownBuilding, 'district' | 'blockNumber' | 'street' | 'houseNumber' | 'corners'>
type Weighted<Value> = readonly (readonly [Value, number])[]

/** The present of the demo, and the years before it in which demolitions were seen. */
export const DEMO_YEAR = 2026
const WATCHED_FROM = 2012

const USES: Readonly<Record<DistrictName, Weighted<Use>>> = {
  Ropewalk: [
    ['terraced', 52],
    ['multi-family', 24],
    ['retail', 10],
    ['office', 4],
    ['public', 3],
    ['warehouse', 4],
    ['hotel', 1],
    ['ancillary', 2],
  ],
  'Kiln Quarter': [
    ['multi-family', 30],
    ['industrial', 24],
    ['warehouse', 16],
    ['office', 12],
    ['retail', 8],
    ['public', 5],
    ['ancillary', 5],
  ],
  'Upper Fold': [
    ['single-family', 68],
    ['terraced', 12],
    ['multi-family', 8],
    ['ancillary', 7],
    ['public', 2],
    ['retail', 2],
    ['agricultural', 1],
  ],
}

const YEARS: Readonly<Record<DistrictName, Weighted<readonly [number, number]>>> = {
  Ropewalk: [
    [[1790, 1859], 10],
    [[1860, 1899], 30],
    [[1900, 1914], 26],
    [[1919, 1939], 12],
    [[1950, 1969], 10],
    [[1970, 1989], 6],
    [[1990, 2015], 6],
  ],
  'Kiln Quarter': [
    [[1880, 1914], 12],
    [[1919, 1939], 14],
    [[1948, 1960], 16],
    [[1961, 1975], 30],
    [[1976, 1990], 16],
    [[1991, 2012], 12],
  ],
  'Upper Fold': [
    [[1900, 1914], 4],
    [[1920, 1939], 18],
    [[1946, 1960], 20],
    [[1961, 1975], 26],
    [[1976, 1990], 16],
    [[1991, 2018], 16],
  ],
}

/** Draws what a building is, from what is usual in its district and time. All of it invented. */
export function drawBuilding(random: Random, place: Place): TownBuilding {
  const use = choose(random, USES[place.district])
  const year = wholeBetween(random, ...choose(random, YEARS[place.district]))
  const structure = drawStructure(random, use, year)
  const isHall = use === 'industrial' || use === 'warehouse' || use === 'agricultural'
  const condition = choose(random, [
    ['good', 26],
    ['fair', 52],
    ['poor', 18],
    ['ruinous', 4],
  ] as const)
  return {
    ...place,
    use,
    structure,
    year,
    storeys: drawStoreys(random, use),
    atticShare:
      isHall || structure === 'reinforced-concrete' || structure === 'precast-panel'
        ? 0
        : choose(random, [
            [0, 40],
            [0.5, 50],
            [1, 10],
          ] as const),
    basementShare: isHall
      ? 0
      : choose(random, [
          [0, 55],
          [0.5, 20],
          [1, 25],
        ] as const),
    condition,
    vacancy: choose(random, [
      ['occupied', 86],
      ['partly-vacant', 8],
      ['vacant', condition === 'ruinous' ? 60 : 4],
    ] as const),
    isProtected: year < 1900 && chance(random, 0.07),
    clearedYear: drawClearedYear(random, year, condition, use),
  }
}

function drawStructure(random: Random, use: Use, year: number): Structure {
  if (use === 'industrial' || use === 'warehouse') {
    return year < 1919
      ? 'masonry-timber-floors'
      : choose(random, [
          ['steel-frame', 60],
          ['reinforced-concrete', 30],
          ['timber-frame', 10],
        ] as const)
  }
  if (use === 'agricultural' || use === 'ancillary')
    return choose(random, [
      ['timber-frame', 55],
      ['masonry-timber-floors', 30],
      ['steel-frame', 15],
    ] as const)
  return year < 1946 ? drawOldStructure(random, year) : drawNewStructure(random, use, year)
}

function drawOldStructure(random: Random, year: number): Structure {
  if (year < 1919)
    return choose(random, [
      ['masonry-timber-floors', 90],
      ['timber-frame', 8],
      ['earth', 2],
    ] as const)
  return choose(random, [
    ['masonry-timber-floors', 60],
    ['masonry-concrete-floors', 30],
    ['timber-frame', 10],
  ] as const)
}

function drawNewStructure(random: Random, use: Use, year: number): Structure {
  if (use === 'single-family' || use === 'terraced')
    return choose(random, [
      ['masonry-concrete-floors', 62],
      ['timber-frame', 22],
      ['masonry-timber-floors', 12],
      ['mass-timber', 4],
    ] as const)
  return choose(random, [
    ['reinforced-concrete', 48],
    ['precast-panel', year < 1991 ? 22 : 4],
    ['masonry-concrete-floors', 24],
    ['hybrid', 6],
  ] as const)
}

function drawStoreys(random: Random, use: Use): number {
  switch (use) {
    case 'single-family':
      return choose(random, [
        [1, 30],
        [1.5, 25],
        [2, 45],
      ] as const)
    case 'terraced':
      return choose(random, [
        [2, 55],
        [2.5, 15],
        [3, 30],
      ] as const)
    case 'multi-family':
      return wholeBetween(random, 3, 6)
    case 'office':
    case 'hotel':
      return wholeBetween(random, 2, 6)
    case 'retail':
    case 'public':
      return wholeBetween(random, 1, 3)
    default:
      return 1
  }
}

/** A yearly chance of a few per thousand, more for the worn and for halls. */
function drawClearedYear(random: Random, year: number, condition: string, use: Use): number | null {
  const worn = condition === 'ruinous' ? 5 : condition === 'poor' ? 2 : 1
  const rate =
    0.0016 * worn * (use === 'industrial' || use === 'warehouse' ? 2.5 : 1) * Math.min(1.5, (DEMO_YEAR - year) / 70)
  for (let cleared = WATCHED_FROM; cleared < DEMO_YEAR; cleared++) {
    if (cleared > year && chance(random, rate)) return cleared
  }
  return null
}
