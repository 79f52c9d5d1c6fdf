import type { FactorPart } from './factorColumns'
import { FACTOR_KEY_FIELDS, factorRowKey } from './factorRowKey'
import type { FactorFault, RawFactorRow } from './judgeFactorRow'

/**
 * Faults of a row beside the other rows of its table: it says the same as another, a whole-building figure stands
 * beside figures of parts, or the years of a suspicion overlap those of the same element.
 *
 * @param others the rest of the table, without the row itself
 */
export function judgeAmongRows(part: FactorPart, row: RawFactorRow, others: readonly RawFactorRow[]): FactorFault[] {
  const key = factorRowKey(part, row)
  const [field = 'source'] = FACTOR_KEY_FIELDS[part]
  if (others.some((other) => factorRowKey(part, other) === key)) return [{ field, code: 'duplicate', parts: { key } }]
  if (part === 'intensities') return judgeSplit(row, others)
  return part === 'suspicions' ? judgeYears(row, others) : []
}

/** A run takes the parts where there are parts, so a whole-building figure beside them would be lost in silence. */
function judgeSplit(row: RawFactorRow, others: readonly RawFactorRow[]): FactorFault[] {
  const isWhole = row['component'] === 'whole'
  const archetype = ['material', 'structure', 'use', 'period']
  const isMixed = others.some(
    (other) => archetype.every((field) => other[field] === row[field]) && (other['component'] === 'whole') !== isWhole,
  )
  return isMixed ? [{ field: 'component', code: 'wholeBesideParts', parts: {} }] : []
}

function judgeYears(row: RawFactorRow, others: readonly RawFactorRow[]): FactorFault[] {
  const bound = (value: unknown, open: number): number => (typeof value === 'number' ? value : open)
  const overlapping = others.find(
    (other) =>
      ['substance', 'component', 'element'].every((field) => other[field] === row[field]) &&
      bound(other['fromYear'], -Infinity) <= bound(row['toYear'], Infinity) &&
      bound(row['fromYear'], -Infinity) <= bound(other['toYear'], Infinity),
  )
  if (!overlapping) return []
  const years = `${String(overlapping['fromYear'] ?? '…')}–${String(overlapping['toYear'] ?? '…')}`
  return [{ field: 'fromYear', code: 'yearsOverlap', parts: { years } }]
}
