import { PERIODS } from '@/shared/compute/factors/vocabulary'
import { lifetimeFromMeanSd } from '@/shared/compute/lifetime/lifetimeFromMeanSd'
import type { LIFETIME_MODELS } from '@/shared/schemas/factorBook'
import { FACTOR_COLUMNS, type FactorColumn, type FactorPart } from './factorColumns'

/** What is wrong with a row: one sentence each in the catalogue. */
export type FactorFaultCode =
  | 'missing'
  | 'basisMissing'
  | 'basisNotGross'
  | 'notANumber'
  | 'notWhole'
  | 'negative'
  | 'zeroLife'
  | 'tooSmall'
  | 'tooLarge'
  | 'tooLong'
  | 'notAChoice'
  | 'periodOverlaps'
  | 'orderReversed'
  | 'lifeImpossible'
  | 'asteriskWrong'
  | 'mirrorHarmless'
  | 'yearsReversed'
  | 'duplicate'
  | 'wholeBesideParts'
  | 'yearsOverlap'
  | 'noBuildingLife'

/** A fault at a field of a row. */
export interface FactorFault {
  readonly field: string
  readonly code: FactorFaultCode
  readonly parts: Readonly<Record<string, string>>
}

/** A row as a form or a file gives it, nothing taken for granted. */
export type RawFactorRow = Readonly<Record<string, unknown>>

/**
 * All faults of one row on its own, at most one a field.
 *
 * @returns empty when the row may stand in an edition
 * @example judgeFactorRow('lifetimes', { use: 'all', structure: 'all', component: 'roof', model: 'fixed', meanYears: 0, sdYears: 0, sharedCv: 0.2, source: 'a survey', provenance: 'published', note: null })[0]?.code // => 'zeroLife'
 */
export function judgeFactorRow(part: FactorPart, row: RawFactorRow): FactorFault[] {
  const faults = FACTOR_COLUMNS[part].flatMap((column) => judgeCell(column, row[column.field]))
  return faults.length > 0 ? faults : judgeWhole(part, row)
}

const fault = (field: string, code: FactorFaultCode, parts: Record<string, string> = {}): FactorFault[] => [
  { field, code, parts },
]

function judgeCell(column: FactorColumn, value: unknown): FactorFault[] {
  const { field, isOptional } = column
  if (value === null || value === undefined || value === '') {
    if (isOptional) return []
    return fault(field, field === 'areaBasis' ? 'basisMissing' : 'missing')
  }
  if (column.kind === 'number') return judgeNumber(column, value)
  if (column.kind === 'yes-no') return typeof value === 'boolean' ? [] : fault(field, 'missing')
  return judgeText(column, String(value))
}

function judgeNumber(column: FactorColumn, value: unknown): FactorFault[] {
  const { field, isWhole } = column
  if (typeof value !== 'number' || !Number.isFinite(value)) return fault(field, 'notANumber')
  if (value < 0) return fault(field, 'negative')
  if (field === 'meanYears' && value === 0) return fault(field, 'zeroLife')
  if (isWhole && !Number.isInteger(value)) return fault(field, 'notWhole')
  return judgeSize(column, value)
}

function judgeSize({ field, least = -Infinity, most = Infinity, isAboveLeast }: FactorColumn, value: number) {
  if (value < least || (isAboveLeast && value === least)) return fault(field, 'tooSmall', { least: String(least) })
  return value > most ? fault(field, 'tooLarge', { most: String(most) }) : []
}

function judgeText(column: FactorColumn, text: string): FactorFault[] {
  const { field, kind, longest = Infinity } = column
  if (text.trim() === '') return fault(field, 'missing')
  if (text.length > longest) return fault(field, 'tooLong', { longest: String(longest) })
  return kind === 'choice' ? judgeChoice(column, text) : []
}

function judgeChoice({ field, choices = [] }: FactorColumn, text: string): FactorFault[] {
  if (choices.includes(text)) return field === 'areaBasis' && text !== 'GFA' ? fault(field, 'basisNotGross') : []
  const overlapped = field === 'period' ? overlappedPeriods(text) : []
  return overlapped.length > 1
    ? fault(field, 'periodOverlaps', { typed: text, periods: overlapped.join(', ') })
    : fault(field, 'notAChoice', { typed: text, choices: choices.join(', ') })
}

/** Construction periods that a span of years such as `1940-1950` reaches into. */
function overlappedPeriods(text: string): string[] {
  const [, from, to] = /^(\d{4})\s*[-–]\s*(\d{4})$/.exec(text.trim()) ?? []
  if (from === undefined || to === undefined) return []
  return PERIODS.filter(
    ({ fromYear, toYear }) => Number(to) >= (fromYear ?? -Infinity) && Number(from) < (toYear ?? Infinity),
  ).map(({ id }) => id)
}

function judgeWhole(part: FactorPart, row: RawFactorRow): FactorFault[] {
  switch (part) {
    case 'intensities':
      return judgeOrder(row)
    case 'lifetimes':
      return judgeLife(row)
    case 'densities':
      return Number(row['lowKgPerM3']) > Number(row['highKgPerM3']) ? fault('highKgPerM3', 'orderReversed') : []
    case 'wasteCodes':
      return judgeCode(row)
    case 'suspicions':
      return isReversed(row['fromYear'], row['toYear']) ? fault('toYear', 'yearsReversed') : []
  }
}

function isReversed(low: unknown, high: unknown): boolean {
  return typeof low === 'number' && typeof high === 'number' && low > high
}

function judgeOrder({ p10KgPerM2: low, medianKgPerM2: middle, p90KgPerM2: high }: RawFactorRow): FactorFault[] {
  if (isReversed(low, high) || isReversed(middle, high)) return fault('p90KgPerM2', 'orderReversed')
  return isReversed(low, middle) ? fault('p10KgPerM2', 'orderReversed') : []
}

function judgeLife({ model, meanYears, sdYears }: RawFactorRow): FactorFault[] {
  try {
    lifetimeFromMeanSd(model as (typeof LIFETIME_MODELS)[number], Number(meanYears), Number(sdYears))
    return []
  } catch {
    return fault('sdYears', 'lifeImpossible', { model: String(model), mean: String(meanYears), sd: String(sdYears) })
  }
}

/** Codes of the European list say with an asterisk that they are hazardous; lists of other countries may not. */
function judgeCode({ code, isHazardous, mirrorHazardousCode: mirror }: RawFactorRow): FactorFault[] {
  const isOfList = /^\d{2} ?\d{2} ?\d{2} ?\*?$/
  if (isOfList.test(String(code)) && String(code).endsWith('*') !== isHazardous)
    return fault('isHazardous', 'asteriskWrong')
  return typeof mirror === 'string' && isOfList.test(mirror) && !mirror.endsWith('*')
    ? fault('mirrorHazardousCode', 'mirrorHarmless')
    : []
}
