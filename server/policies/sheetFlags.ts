import type { Flag } from '@/shared/api/review'
import type { RegisterAttributes } from '@/shared/schemas/outline'
import type { SheetAnswers } from '@/shared/schemas/sheet'
import type { UseOrUnknown } from '@/shared/compute/factors/vocabulary'

/** What a sheet is compared with before a planner looks at it. */
export interface FlagBasis {
  readonly answers: SheetAnswers
  /** Footprint of the outline [m²]; null without one. */
  readonly outlineFootprintM2: number | null
  readonly register: RegisterAttributes
  readonly grossFloorAreaM2: number | null
  /** From the recorded position to the outline [m]; null without one of both. */
  readonly distanceM: number | null
  /** Photos that are stored or on their way. */
  readonly photoCount: number
  readonly openConflictCount: number
}

const FAR_M = 50
const DOUBTFUL_ACCURACY_M = 50
const MOST_FOOTPRINT_RATIO = 1.3
const GROSS_FLOOR_AREA_RANGE_M2 = [10, 250_000] as const
const YEAR_TOLERANCE_YEARS = 10
const STOREY_HEIGHT_RANGE_M = [2.2, 5] as const
const HALL_STOREY_HEIGHT_M = 15
const ROOF_M = 6
const MUCH_NOT_KNOWN = 2

/** More storeys than these are looked at: common practice. */
const MOST_STOREYS: Readonly<Partial<Record<UseOrUnknown, number>>> = {
  'single-family': 4,
  terraced: 5,
  agricultural: 4,
  ancillary: 3,
  warehouse: 6,
  industrial: 12,
}
const MOST_STOREYS_ELSEWHERE = 40
const HALLS: ReadonlySet<UseOrUnknown> = new Set([
  'industrial',
  'warehouse',
  'agricultural',
  'public',
  'retail',
  'other',
])

const checks: Readonly<Record<Flag, (basis: FlagBasis) => boolean>> = {
  'photo-missing': ({ photoCount, answers }) => isStanding(answers) && photoCount === 0,
  'far-from-outline': ({ distanceM, answers }) =>
    distanceM !== null && distanceM - (answers.position?.accuracyM ?? 0) > FAR_M,
  'position-doubtful': ({ answers }) => (answers.position?.accuracyM ?? 0) > DOUBTFUL_ACCURACY_M,
  'area-out-of-range': isAreaOutOfRange,
  'storeys-out-of-range': ({ answers }) =>
    (storeysOf(answers) ?? 0) > (MOST_STOREYS[answers.use?.use ?? 'unknown'] ?? MOST_STOREYS_ELSEWHERE),
  'year-contradicts-register': contradictsYear,
  'storeys-contradict-height': contradictsHeight,
  'conflict-open': ({ openConflictCount }) => openConflictCount > 0,
  'much-not-known': ({ answers }) => isStanding(answers) && countNotKnown(answers) >= MUCH_NOT_KNOWN,
  'not-confirmed': ({ answers }) => Object.values(answers).some(isUnconfirmed),
}

/** What a planner should look at first, in the order of the contract. A flag is a question, never a verdict. */
export function sheetFlags(basis: FlagBasis): Flag[] {
  return FLAG_ORDER.filter((flag) => checks[flag](basis))
}
const FLAG_ORDER = Object.keys(checks).filter((name): name is Flag => name in checks)

/** Taken over from the register or the last building, and looked at by nobody. */
function isUnconfirmed(answer: object | undefined): boolean {
  return answer !== undefined && 'unconfirmed' in answer && answer.unconfirmed !== undefined
}

function isStanding({ finding }: SheetAnswers): boolean {
  return (finding?.kind ?? 'standing') === 'standing'
}

function storeysOf(answers: SheetAnswers): number | null {
  return isStanding(answers) ? (answers.storeys?.aboveGround ?? null) : null
}

function isAreaOutOfRange({ answers, outlineFootprintM2, grossFloorAreaM2 }: FlagBasis): boolean {
  const footprintM2 = answers.footprint?.footprintM2
  const ratio = footprintM2 !== undefined && outlineFootprintM2 !== null ? footprintM2 / outlineFootprintM2 : 1
  if (ratio > MOST_FOOTPRINT_RATIO || ratio < 1 / MOST_FOOTPRINT_RATIO) return true
  const [least, most] = GROSS_FLOOR_AREA_RANGE_M2
  return grossFloorAreaM2 !== null && (grossFloorAreaM2 < least || grossFloorAreaM2 > most)
}

function contradictsYear({ answers: { constructionYear: year }, register }: FlagBasis): boolean {
  if (register.year === null || year === undefined || year.kind === 'unknown') return false
  const [from, to] = year.kind === 'exact' ? [year.year, year.year] : [year.fromYear, year.toYear]
  return register.year < from - YEAR_TOLERANCE_YEARS || register.year > to + YEAR_TOLERANCE_YEARS
}

/** The register's height may be to the eaves or to the ridge: a roof is allowed for on the high side. */
function contradictsHeight({ answers, register: { heightM } }: FlagBasis): boolean {
  const storeys = storeysOf(answers)
  if (heightM === null || heightM === 0 || storeys === null) return false
  const highestM = HALLS.has(answers.use?.use ?? 'unknown') ? HALL_STOREY_HEIGHT_M : STOREY_HEIGHT_RANGE_M[1]
  return heightM < storeys * STOREY_HEIGHT_RANGE_M[0] || heightM > storeys * highestM + ROOF_M
}

function countNotKnown({ use, structure, storeys, footprint, constructionYear }: SheetAnswers): number {
  return [
    use === undefined || use.use === 'unknown',
    structure === undefined || structure.structure === 'unknown',
    storeys === undefined || storeys.aboveGround === null,
    footprint === undefined,
    constructionYear === undefined || constructionYear.kind === 'unknown',
  ].filter(Boolean).length
}
