import { ComputeError } from '@/shared/compute/errors'
import { sum } from '@/shared/compute/sum'

export type KappaWeights = 'none' | 'linear' | 'quadratic'

export interface Agreement {
  readonly observed: number
  readonly byChance: number
  /** Null when both used one class only: agreement by chance is complete then and κ says nothing. */
  readonly kappa: number | null
  /** √(po(1 − po)/(n(1 − pe)²)), and the large-sample one for unweighted κ. */
  readonly simpleStandardError: number | null
  readonly standardError: number | null
}

/**
 * Cohen's κ of two surveyors' classes, κ = (po − pe)/(1 − pe), weighted for ordered classes.
 *
 * @param table counts, rows the first surveyor, columns the second; square
 * @throws {ComputeError} `length-mismatch`, `empty-input`, `negative-amount`
 * @see Cohen, J. (1960, 1968); Fleiss, J. L., Cohen, J. & Everitt, B. S. (1969). Psychological Bulletin 72, 323–327.
 * @example
 * cohenKappa([[5, 0], [0, 5]]).kappa // => 1
 */
export function cohenKappa(table: readonly (readonly number[])[], weights: KappaWeights = 'none'): Agreement {
  const size = table.length
  if (table.some((row) => row.length !== size)) throw new ComputeError('length-mismatch', { rows: size })
  if (table.some((row) => row.some((count) => !(count >= 0)))) throw new ComputeError('negative-amount', { table })
  const n = sum(table.flat())
  if (!(n > 0)) throw new ComputeError('empty-input', { what: 'pairs' })
  const share = table.map((row) => row.map((count) => count / n))
  const rows = share.map((row) => sum(row))
  const columns = share.map((_, column) => sum(share.map((row) => row[column]!)))
  const weight = (i: number, j: number) => weightOf(Math.abs(i - j), size, weights)
  const observed = sum(share.flatMap((row, i) => row.map((p, j) => weight(i, j) * p)))
  const byChance = sum(rows.flatMap((r, i) => columns.map((c, j) => weight(i, j) * r * c)))
  if (1 - byChance < 1e-12) return { observed, byChance, kappa: null, simpleStandardError: null, standardError: null }
  const kappa = (observed - byChance) / (1 - byChance)
  const spread = sum(
    share.flatMap((row, i) =>
      row.map((p, j) => {
        const marginal = sum(columns.map((c, k) => c * weight(i, k))) + sum(rows.map((r, k) => r * weight(k, j)))
        return p * (weight(i, j) - marginal * (1 - kappa)) ** 2
      }),
    ),
  )
  const variance = (spread - (kappa - byChance * (1 - kappa)) ** 2) / (n * (1 - byChance) ** 2)
  return {
    observed,
    byChance,
    kappa,
    simpleStandardError: Math.sqrt((observed * (1 - observed)) / n) / (1 - byChance),
    standardError: Math.sqrt(Math.max(0, variance)),
  }
}

function weightOf(distance: number, size: number, weights: KappaWeights): number {
  if (distance === 0) return 1
  if (weights === 'none') return 0
  const relative = distance / (size - 1)
  return weights === 'linear' ? 1 - relative : 1 - relative ** 2
}
