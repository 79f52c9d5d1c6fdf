import { ComputeError } from '@/shared/compute/errors'
import { sum } from '@/shared/compute/sum'
import type { AreaBasis } from './vocabulary'

/** What is known of a factor: a figure, nothing, or too little to weigh. */
export type StockFactor =
  | { readonly kind: 'known'; readonly kgPerM2: number; readonly areaBasis: AreaBasis }
  | { readonly kind: 'missing' }
  | { readonly kind: 'trace' }

/** A building as the tally of its material needs it. */
export interface StockBuilding<M extends string> {
  readonly buildingId: string
  readonly amount: number
  readonly areaBasis: AreaBasis
  /** Factor of each material. A material that is not named is missing. */
  readonly factors: Readonly<Partial<Record<M, StockFactor>>>
  /** Masses measured on this building [kg]: they replace the factor. */
  readonly measuredKg?: Readonly<Partial<Record<M, number>>>
}

/** Stock of one material. */
export interface MaterialStock {
  /** Sum over the buildings it is known for [kg]. */
  readonly knownKg: number
  readonly missingBuildingIds: readonly string[]
  readonly traceBuildingIds: readonly string[]
}

/**
 * Material stock of buildings,
 *
 *     M = Σ Aᵢ · F_m
 *
 * with measured masses in place of the product where they exist. A building without a factor is named, not counted as
 * none.
 *
 * @param buildings amounts [m², or m³ on the basis `volume`], ≥ 0
 * @param materials wanted materials
 * @returns for each material the known mass [kg] and the buildings for which it is missing or a trace
 * @throws {ComputeError} `mixed-area-bases` a factor on another basis than the area; `negative-area`, `negative-amount`
 * @see Augiseau, V., Barles, S. (2017). Studying construction materials flows and stock: a review. Resources,
 *   Conservation and Recycling 123, 153–164 (bottom-up accounting).
 * @example
 * buildingStock([{ buildingId: 'b', amount: 100, areaBasis: 'GFA', factors: { steel: { kind: 'known', kgPerM2: 30, areaBasis: 'GFA' } } }], ['steel', 'glass']).glass // => { knownKg: 0, missingBuildingIds: ['b'], traceBuildingIds: [] }
 */
export function buildingStock<M extends string>(
  buildings: readonly StockBuilding<M>[],
  materials: readonly M[],
): Readonly<Record<M, MaterialStock>> {
  const masses = materials.map((material) => {
    const found = buildings.map((building) => ({ id: building.buildingId, mass: massOf(building, material) }))
    const idsOf = (state: 'missing' | 'trace') => found.filter(({ mass }) => mass === state).map(({ id }) => id)
    const stock: MaterialStock = {
      knownKg: sum(found.flatMap(({ mass }) => (typeof mass === 'number' ? [mass] : []))),
      missingBuildingIds: idsOf('missing'),
      traceBuildingIds: idsOf('trace'),
    }
    return [material, stock] as const
  })
  // Object.fromEntries forgets its keys; they are exactly the materials asked for.
  return Object.fromEntries(masses) as Record<M, MaterialStock>
}

function massOf<M extends string>(building: StockBuilding<M>, material: M): number | 'missing' | 'trace' {
  const { buildingId, amount, areaBasis, factors, measuredKg } = building
  if (!(amount >= 0)) throw new ComputeError('negative-area', { buildingId, amount })
  const measured = measuredKg?.[material]
  if (measured !== undefined) {
    if (!(measured >= 0)) throw new ComputeError('negative-amount', { buildingId, material, measured })
    return measured
  }
  const factor = factors[material]
  if (factor === undefined || factor.kind !== 'known') return factor?.kind ?? 'missing'
  if (factor.areaBasis !== areaBasis) {
    throw new ComputeError('mixed-area-bases', { buildingId, material, area: areaBasis, factor: factor.areaBasis })
  }
  if (!(factor.kgPerM2 >= 0)) throw new ComputeError('negative-amount', { buildingId, material, ...factor })
  return amount * factor.kgPerM2
}
