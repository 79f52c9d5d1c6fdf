import type { CodeComparison } from '@/shared/schemas/listing'

/** Where a weighed mass lies beside the band that was expected. */
export type ComparisonVerdict = 'inside' | 'below' | 'above' | 'unexpected'

/** @returns null where nothing was weighed under the code */
export function comparisonVerdict({ weighedKg, expectedKg }: CodeComparison): ComparisonVerdict | null {
  if (weighedKg === null) return null
  if (expectedKg.high === 0) return 'unexpected'
  if (weighedKg < expectedKg.low) return 'below'
  return weighedKg > expectedKg.high ? 'above' : 'inside'
}
