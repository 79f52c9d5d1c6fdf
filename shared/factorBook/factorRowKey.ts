import type { FactorPart } from './factorColumns'
import type { RawFactorRow } from './judgeFactorRow'

/** Fields that say what a row is about; the others say what is known of it. */
export const FACTOR_KEY_FIELDS: Readonly<Record<FactorPart, readonly string[]>> = {
  intensities: ['material', 'structure', 'use', 'period', 'component'],
  lifetimes: ['use', 'structure', 'component'],
  densities: ['material', 'load', 'state'],
  wasteCodes: ['code'],
  suspicions: ['substance', 'component', 'element', 'fromYear', 'toYear'],
}

/**
 * What a row is about, the same in every edition. The region of a factor is no part of it: a run does not choose by
 * region, so an edition holds one figure for each archetype, material and component.
 *
 * @example factorRowKey('wasteCodes', { code: '17 01 01' }) // => '17 01 01'
 */
export function factorRowKey(part: FactorPart, row: RawFactorRow): string {
  return FACTOR_KEY_FIELDS[part].map((field) => String(row[field] ?? '').trim()).join(' · ')
}
