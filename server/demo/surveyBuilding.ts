import { PERIODS } from '@/shared/compute/factors/vocabulary'
import type { KnownBy, SheetAnswers } from '@/shared/schemas/sheet'
import { chance, choose } from './draw'
import type { Random, TownBuilding } from './town.types'

/**
 * What an invented surveyor wrote of an invented building: mostly right, sometimes a guess,
 * sometimes "not known", as real sheets are.
 *
 * @param inYear year of the round; a building that came down before it is recorded as cleared
 */
export function surveyBuilding(
  random: Random,
  building: TownBuilding,
  footprintM2: number,
  inYear: number,
): SheetAnswers {
  if (building.clearedYear !== null && building.clearedYear <= inYear) {
    return { finding: { kind: 'cleared', clearedYear: building.clearedYear } }
  }
  if (chance(random, 0.012)) return { finding: { kind: 'inaccessible' } }
  return {
    finding: { kind: 'standing' },
    use: { use: building.use, knownBy: 'seen' },
    structure: surveyStructure(random, building),
    storeys: { aboveGround: building.storeys, knownBy: 'seen' },
    footprint: { footprintM2, knownBy: 'register' },
    attic: { floorShare: building.atticShare, knownBy: 'seen' },
    basement: chance(random, 0.4)
      ? { floorShare: null }
      : { floorShare: building.basementShare, knownBy: chance(random, 0.5) ? 'told' : 'seen' },
    constructionYear: surveyYear(random, building, inYear),
    condition: { condition: building.condition, knownBy: 'seen' },
    vacancy: { vacancy: building.vacancy, knownBy: 'seen' },
    ...(building.isProtected ? { protection: { isProtected: true, knownBy: 'register' as const } } : {}),
    ...(chance(random, 0.08) ? { notes: { text: choose(random, NOTES) } } : {}),
  }
}

const NOTES = [
  ['Rear wing not seen from the street.', 3],
  ['New windows on the street front.', 3],
  ['Shop front altered, upper storeys as built.', 2],
  ['Roof covering looks recent.', 2],
  ['Scaffolding on the gable.', 1],
] as const

function surveyStructure(random: Random, building: TownBuilding): NonNullable<SheetAnswers['structure']> {
  if (chance(random, 0.09)) return { structure: 'unknown' }
  return {
    structure: building.structure,
    knownBy: choose<KnownBy>(random, [
      ['seen', 70],
      ['guessed', 22],
      ['told', 8],
    ]),
  }
}

function surveyYear(
  random: Random,
  building: TownBuilding,
  inYear: number,
): NonNullable<SheetAnswers['constructionYear']> {
  if (chance(random, 0.5)) return { kind: 'exact', year: building.year, knownBy: 'register' }
  if (chance(random, 0.14)) return { kind: 'unknown' }
  const period = PERIODS.find(
    ({ fromYear, toYear }) => building.year >= (fromYear ?? 0) && building.year < (toYear ?? 3_000),
  )
  const half = choose(random, [
    [5, 3],
    [10, 4],
    [15, 2],
  ] as const)
  const fromYear = Math.max(period?.fromYear ?? 1780, building.year - half)
  return {
    kind: 'between',
    fromYear,
    toYear: Math.min((period?.toYear ?? 2_027) - 1, building.year + half, inYear),
    knownBy: 'guessed',
  }
}
