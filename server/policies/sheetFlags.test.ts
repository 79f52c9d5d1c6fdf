import { describe, expect, it } from 'vitest'
import { FLAGS, type Flag } from '@/shared/api/review'
import type { SheetAnswers } from '@/shared/schemas/sheet'
import { sheetFlags, type FlagBasis } from './sheetFlags'

const answers: SheetAnswers = {
  finding: { kind: 'standing' },
  use: { use: 'terraced', knownBy: 'seen' },
  structure: { structure: 'masonry-timber-floors', knownBy: 'seen' },
  storeys: { aboveGround: 2, knownBy: 'seen' },
  footprint: { footprintM2: 100, knownBy: 'register' },
  constructionYear: { kind: 'exact', year: 1930, knownBy: 'register' },
  position: { longitude: 8, latitude: 47, accuracyM: 8 },
}
const plain: FlagBasis = {
  answers,
  outlineFootprintM2: 100,
  register: { year: 1930, storeys: 2, heightM: 7.5, use: 'terraced' },
  grossFloorAreaM2: 200,
  distanceM: 5,
  photoCount: 1,
  openConflictCount: 0,
}
const answering = (change: SheetAnswers): FlagBasis => ({ ...plain, answers: { ...answers, ...change } })

const cases: [Flag, string, FlagBasis][] = [
  [
    'not-confirmed',
    'the storeys stand as the register has them',
    answering({ storeys: { aboveGround: 2, knownBy: 'register', unconfirmed: 'register' } }),
  ],
  ['photo-missing', 'there is none', { ...plain, photoCount: 0 }],
  ['far-from-outline', 'the position is 80 m away', { ...plain, distanceM: 80 }],
  [
    'position-doubtful',
    'it is good to 60 m only',
    answering({ position: { longitude: 8, latitude: 47, accuracyM: 60 } }),
  ],
  [
    'area-out-of-range',
    'the footprint is twice the outline',
    answering({ footprint: { footprintM2: 200, knownBy: 'guessed' } }),
  ],
  [
    'area-out-of-range',
    'the footprint is half the outline',
    answering({ footprint: { footprintM2: 50, knownBy: 'guessed' } }),
  ],
  ['area-out-of-range', 'the floor area is tiny', { ...plain, grossFloorAreaM2: 4 }],
  ['area-out-of-range', 'the floor area is immense', { ...plain, grossFloorAreaM2: 300_000 }],
  [
    'storeys-out-of-range',
    'a terraced house has eight',
    { ...answering({ storeys: { aboveGround: 8, knownBy: 'seen' } }), register: { ...plain.register, heightM: null } },
  ],
  [
    'year-contradicts-register',
    'it is 40 years off',
    answering({ constructionYear: { kind: 'exact', year: 1970, knownBy: 'told' } }),
  ],
  [
    'year-contradicts-register',
    'the range begins 40 years after',
    answering({ constructionYear: { kind: 'between', fromYear: 1970, toYear: 1980, knownBy: 'guessed' } }),
  ],
  ['storeys-contradict-height', 'four stand in 7.5 m', answering({ storeys: { aboveGround: 4, knownBy: 'seen' } })],
  ['storeys-contradict-height', 'two stand in 30 m', { ...plain, register: { ...plain.register, heightM: 30 } }],
  ['conflict-open', 'two people differ', { ...plain, openConflictCount: 1 }],
  [
    'much-not-known',
    'structure and year are not known',
    answering({ structure: { structure: 'unknown' }, constructionYear: { kind: 'unknown' } }),
  ],
]

describe('flags of a sheet', () => {
  it('raises none on a plain sheet', () => {
    expect(sheetFlags(plain)).toEqual([])
  })

  it.each(cases)('raises only %s when %s', (flag, _when, basis) => {
    expect(sheetFlags(basis)).toEqual([flag])
  })

  it('has a case for every flag of the contract', () => {
    expect(new Set(cases.map(([flag]) => flag))).toEqual(new Set(FLAGS))
  })

  it('asks nothing of a building that is gone or could not be reached, and nothing without a register', () => {
    const gone: SheetAnswers = { finding: { kind: 'cleared', clearedYear: 2020 } }
    const silent = { year: null, storeys: null, heightM: null, use: null }

    expect(sheetFlags({ ...plain, answers: gone, photoCount: 0, grossFloorAreaM2: null, distanceM: null })).toEqual([])
    expect(sheetFlags({ ...plain, register: silent, outlineFootprintM2: null })).toEqual([])
  })

  it('allows a hall its height, and a position its accuracy', () => {
    const hall = answering({ use: { use: 'warehouse', knownBy: 'seen' }, storeys: { aboveGround: 1, knownBy: 'seen' } })

    expect(sheetFlags({ ...hall, register: { ...plain.register, heightM: 14 } })).toEqual([])
    expect(
      sheetFlags({
        ...answering({ position: { longitude: 8, latitude: 47, accuracyM: 40 } }),
        distanceM: 80,
      }),
    ).toEqual([])
  })
})
