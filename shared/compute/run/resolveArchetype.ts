import { intensityFor } from '@/shared/compute/factors/intensityFor'
import type { ArchetypeKey, IntensityFigure } from '@/shared/compute/factors/intensity.types'
import { COMPONENTS, MATERIALS, type Component, type Material } from '@/shared/compute/factors/vocabulary'
import { ComputeError } from '@/shared/compute/errors'
import { lifetimeFromMeanSd } from '@/shared/compute/lifetime/lifetimeFromMeanSd'
import type { LifetimeModel } from '@/shared/compute/lifetime/lifetime.types'
import { scaleLifetime } from '@/shared/compute/lifetime/scaleLifetime'
import type { Archetype, FactorUse, LifetimeUse } from './run.types'

/** One lifetime of a factor book. */
export interface LifetimeFigure {
  readonly rowId: string
  readonly use: string
  readonly structure: string
  readonly component: Component | 'building'
  readonly model: LifetimeModel
  readonly meanYears: number
  readonly sdYears: number
  /** Coefficient of variation of the mean life, shared by the class. */
  readonly sharedCv: number
}

export interface ResolvedArchetype extends Archetype {
  /** Materials for which the book has no figure: their stock is not available, which is not zero. */
  readonly missing: readonly Material[]
  readonly rowIdsByMaterial: ReadonlyMap<Material, readonly string[]>
}

/**
 * Gathers what a run needs of a kind of building from one edition of the factor book: its factors, split by
 * component where the book splits them, the life of the building, and the lives of its components.
 *
 * @example
 * resolveArchetype({ use: 'office', structure: 'unknown', periodId: 'unknown' }, [], [{ rowId: 'l', use: 'all', structure: 'all', component: 'building', model: 'fixed', meanYears: 60, sdYears: 0, sharedCv: 0 }]).life.longer // => { model: 'fixed', lifetimeYears: 60 }
 *
 * @throws {ComputeError} `factor-missing` when the book has no lifetime for the building, `mixed-area-bases`
 */
export function resolveArchetype(
  key: ArchetypeKey,
  figures: readonly IntensityFigure[],
  lifetimes: readonly LifetimeFigure[],
): ResolvedArchetype {
  const factors: FactorUse[] = []
  const missing: Material[] = []
  const rowIdsByMaterial = new Map<Material, readonly string[]>()
  for (const material of MATERIALS) {
    const found = intensityFor(key, material, figures)
    if (found.kind === 'missing') missing.push(material)
    if (found.kind !== 'known') continue
    rowIdsByMaterial.set(
      material,
      found.parts.flatMap(({ rowIds }) => rowIds),
    )
    for (const part of found.parts) {
      factors.push({
        material,
        component: part.component,
        factorId: [...part.figureIds].sort().join('+'),
        meanKgPerM2: part.meanKgPerM2,
        sharedCv: part.sharedCv,
        betweenBuildingsCv: part.betweenBuildingsCv ?? 0,
      })
    }
  }
  return {
    use: key.use,
    structure: key.structure,
    period: key.periodId,
    factors,
    missing,
    rowIdsByMaterial,
    life: lifetimeUse(mostSpecific(key, 'building', lifetimes)),
    componentLives: Object.fromEntries(componentLives(key, lifetimes)),
  }
}

function componentLives(key: ArchetypeKey, lifetimes: readonly LifetimeFigure[]): [Component, LifetimeUse][] {
  return COMPONENTS.flatMap((component): [Component, LifetimeUse][] => {
    const rows = lifetimes.filter((row) => row.component === component)
    return rows.length > 0 ? [[component, lifetimeUse(mostSpecific(key, component, rows))]] : []
  })
}

/** The row that agrees in most: structure tells more of a building's life than its use does only where the book says so. */
function mostSpecific(
  key: ArchetypeKey,
  component: Component | 'building',
  lifetimes: readonly LifetimeFigure[],
): LifetimeFigure {
  const fitting = lifetimes.filter(
    (row) =>
      row.component === component &&
      (row.use === 'all' || row.use === key.use) &&
      (row.structure === 'all' || row.structure === key.structure),
  )
  const rank = (row: LifetimeFigure) => (row.use === 'all' ? 0 : 2) + (row.structure === 'all' ? 0 : 1)
  const [best] = [...fitting].sort((a, b) => rank(b) - rank(a))
  if (!best)
    throw new ComputeError('factor-missing', { what: 'lifetime', component, use: key.use, structure: key.structure })
  return best
}

function lifetimeUse({ rowId, model, meanYears, sdYears, sharedCv }: LifetimeFigure): LifetimeUse {
  const lifetime = lifetimeFromMeanSd(model, meanYears, sdYears)
  // a life is positive: its error is lognormal, as that of a factor
  const logSd = Math.sqrt(Math.log1p(sharedCv ** 2))
  return {
    lifetimeId: rowId,
    lifetime,
    shorter: scaleLifetime(lifetime, Math.exp(-logSd)),
    longer: scaleLifetime(lifetime, Math.exp(logSd)),
  }
}
