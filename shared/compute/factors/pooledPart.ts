import { ComputeError } from '@/shared/compute/errors'
import { combinedCv } from './combinedCv'
import type { IntensityFigure, IntensityPart } from './intensity.types'

/**
 * One figure from several rows of the same component: their mean weighted by the buildings behind them. The spread
 * of the rows around it goes into the error, because nobody knows which of them would be right.
 *
 * @param rows at least one row of one component, each with a mean or a median
 * @returns the pooled figure; for one row the row's own
 * @throws {ComputeError} `empty-input`, `factor-missing`
 * @remarks A row with a median only gets its mean as median·e^{σ²/2}, σ = ln GSD.
 * @see Cochran, W. G. (1977). Sampling techniques, chapter 5, for weighted means.
 * @example
 * pooledPart([{ rowId: 'a', figureId: 'f', use: 'all', structure: 'all', period: 'all', material: 'glass', component: 'openings', areaBasis: 'GFA', meanKgPerM2: 3, medianKgPerM2: 2, gsdBetweenBuildings: null, sharedCv: 0.25, sampleCount: 9, source: '', provenance: 'open-dataset' }]).meanKgPerM2 // => 3
 */
export function pooledPart(rows: readonly IntensityFigure[]): IntensityPart {
  const [first] = rows
  if (first === undefined) throw new ComputeError('empty-input', { rows: 0 })
  const weights = rows.map(({ sampleCount }) => Math.max(1, sampleCount ?? 1))
  const total = weights.reduce((sum, weight) => sum + weight, 0)
  const weighted = (value: (row: IntensityFigure) => number) =>
    rows.reduce((sum, row, index) => sum + value(row) * ((weights[index] ?? 0) / total), 0)
  const meanKgPerM2 = weighted(meanOf)
  const variance = weighted((row) => (meanOf(row) - meanKgPerM2) ** 2)
  const spreadCv = meanKgPerM2 > 0 ? Math.sqrt(variance) / meanKgPerM2 : 0
  return {
    component: first.component,
    meanKgPerM2,
    sharedCv: combinedCv([weighted(({ sharedCv }) => sharedCv), spreadCv]),
    betweenBuildingsCv: betweenBuildingsCv(rows),
    rowIds: rows.map(({ rowId }) => rowId),
    figureIds: [...new Set(rows.map(({ figureId }) => figureId))],
    provenances: [...new Set(rows.map(({ provenance }) => provenance))],
  }
}

function meanOf({ rowId, meanKgPerM2, medianKgPerM2, gsdBetweenBuildings }: IntensityFigure): number {
  if (meanKgPerM2 !== null) return meanKgPerM2
  if (medianKgPerM2 === null) throw new ComputeError('factor-missing', { rowId })
  return medianKgPerM2 * Math.exp(Math.log(gsdBetweenBuildings ?? 1) ** 2 / 2)
}

function betweenBuildingsCv(rows: readonly IntensityFigure[]): number | null {
  const spreads = rows.flatMap(({ gsdBetweenBuildings }) => (gsdBetweenBuildings === null ? [] : [gsdBetweenBuildings]))
  if (spreads.length === 0) return null
  return Math.sqrt(Math.expm1(Math.log(Math.max(...spreads)) ** 2))
}
