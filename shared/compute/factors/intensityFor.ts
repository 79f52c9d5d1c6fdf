import { ComputeError } from '@/shared/compute/errors'
import { combinedCv } from './combinedCv'
import type { ArchetypeAttribute, ArchetypeKey, Intensity, IntensityFigure, IntensityPart } from './intensity.types'
import { pooledPart } from './pooledPart'
import { POOLING_CV } from './sharedCvDefaults'
import type { Material } from './vocabulary'

/** Attributes given up one after the other: the least telling first, the structure last. */
const STEPS: readonly (readonly ArchetypeAttribute[])[] = [
  [],
  ['period'],
  ['use'],
  ['use', 'period'],
  ['structure'],
  ['structure', 'period'],
  ['structure', 'use'],
  ['structure', 'use', 'period'],
]

/**
 * Looks up what a square metre of a kind of building contains of a material. Where the book has no figure for all
 * attributes, or an attribute is unknown, it falls back on figures that do not distinguish it — the book's own pooled
 * row, else the mean of the single rows weighted by their buildings — and widens the error. Never zero for want of a
 * figure.
 *
 * @param archetype use, structure, period; each may be unknown
 * @param material wanted material
 * @param figures rows of one edition, any order; one area basis a material
 * @returns `known` with one part a component (or one for the whole building), `trace`, or `missing` with its reason
 * @throws {ComputeError} `mixed-area-bases` when rows that would be added stand on different bases
 * @see widening by attribute: common practice, POOLING_CV.
 * @example
 * intensityFor({ use: 'office', structure: 'unknown', periodId: 'unknown' }, 'glass', []) // => { kind: 'missing', reason: 'no-row' }
 */
export function intensityFor(
  archetype: ArchetypeKey,
  material: Material,
  figures: readonly IntensityFigure[],
): Intensity {
  const ofMaterial = figures.filter((figure) => figure.material === material)
  const reported = ofMaterial.filter(isReported)
  for (const dropped of STEPS) {
    const rows = rowsWithout(dropped, archetype, reported)
    if (rows.length === 0) continue
    const weighed = rows.filter(({ isTrace }) => isTrace !== true)
    if (weighed.length === 0) return { kind: 'trace' }
    return known(
      weighed,
      dropped.filter((attribute) => isDistinguished(attribute, reported)),
    )
  }
  return { kind: 'missing', reason: ofMaterial.length > 0 ? 'not-reported' : 'no-row' }
}

function isReported({ meanKgPerM2, medianKgPerM2, isTrace }: IntensityFigure): boolean {
  return meanKgPerM2 !== null || medianKgPerM2 !== null || isTrace === true
}

function valueOf(attribute: ArchetypeAttribute, of: IntensityFigure | ArchetypeKey): string {
  if (attribute === 'period') return 'period' in of ? of.period : of.periodId
  return of[attribute]
}

/** Rows that agree in every attribute kept; of the dropped ones, pooled rows go before single ones. */
function rowsWithout(
  dropped: readonly ArchetypeAttribute[],
  archetype: ArchetypeKey,
  figures: readonly IntensityFigure[],
): readonly IntensityFigure[] {
  const kept = (['use', 'structure', 'period'] as const).filter((attribute) => !dropped.includes(attribute))
  const matching = figures.filter((figure) =>
    kept.every((attribute) => valueOf(attribute, figure) === valueOf(attribute, archetype)),
  )
  const pooled = matching.filter((figure) => dropped.every((attribute) => valueOf(attribute, figure) === 'all'))
  return pooled.length > 0 ? pooled : matching
}

/** Pooling over an attribute costs nothing where the book never makes a difference by it. */
function isDistinguished(attribute: ArchetypeAttribute, figures: readonly IntensityFigure[]): boolean {
  return figures.some((figure) => valueOf(attribute, figure) !== 'all')
}

function known(rows: readonly IntensityFigure[], pooledOver: readonly ArchetypeAttribute[]): Intensity {
  const bases = [...new Set(rows.map(({ areaBasis }) => areaBasis))]
  const [areaBasis] = bases
  if (areaBasis === undefined || bases.length > 1) throw new ComputeError('mixed-area-bases', { bases })
  const split = rows.filter(({ component }) => component !== 'whole')
  const isSplit = split.length > 0
  const used = isSplit ? split : rows
  const components = [...new Set(used.map(({ component }) => component))]
  const widening = pooledOver.map((attribute) => POOLING_CV[attribute])
  const parts = components.map((component): IntensityPart => {
    const part = pooledPart(used.filter((row) => row.component === component))
    return { ...part, sharedCv: combinedCv([part.sharedCv, ...widening]) }
  })
  const meanKgPerM2 = parts.reduce((total, part) => total + part.meanKgPerM2, 0)
  return {
    kind: 'known',
    parts,
    meanKgPerM2,
    sharedCv: correlatedCv(parts, meanKgPerM2),
    areaBasis,
    isSplit,
    pooledOver,
  }
}

/** Parts of one material mostly come from one source: their errors are taken to move together. */
function correlatedCv(parts: readonly IntensityPart[], meanKgPerM2: number): number {
  if (meanKgPerM2 === 0) return Math.max(...parts.map(({ sharedCv }) => sharedCv))
  return parts.reduce((total, part) => total + part.meanKgPerM2 * part.sharedCv, 0) / meanKgPerM2
}
