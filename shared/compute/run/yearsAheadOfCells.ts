import type { Component, Material } from '@/shared/compute/factors/vocabulary'
import { makeChanceBook, type ChanceBook } from './chanceBook'
import { lifetimeDoubt } from './lifetimeDoubt'
import type { Archetype, BuildingCell, FactorUse, VarianceByCause, YearsAheadConventions } from './run.types'
import { spreadByFactor } from './spreadByFactor'

/** Mean [kg/yr] and variance by cause [kg²/yr²], entry k for survey year + 1 + k. */
export interface FlowEstimate {
  /** Under the lives as given. */
  readonly meanKg: Float64Array
  /** What the doubt of the lives adds to the mean, ½·f″σ²: a band stands around the mean with this added [kg/yr]. */
  readonly lifetimeShiftKg: Float64Array
  readonly varianceByCauseKg2: Readonly<Record<keyof VarianceByCause, Float64Array>>
}

export interface FlowByMaterial {
  readonly total: FlowEstimate
  readonly byMaterial: ReadonlyMap<Material, FlowEstimate>
}

export interface YearsAhead {
  readonly demolition: FlowByMaterial
  /** All materials, up to and with each year. */
  readonly cumulativeDemolition: FlowEstimate
  readonly refurbishment: FlowByMaterial
  readonly expectedBuildings: Float64Array
  readonly expectedFloorAreaM2: Float64Array
  /** Expected number of buildings whose model leaves no survivor at the survey. */
  readonly overdueBuildings: number
}

/** Sums over the buildings of an archetype, each as long as the horizon. */
interface FlowSums {
  /** The lifetime whose error all of these share. */
  readonly lifeId: string
  /** Σ A p under the life as given, shorter and longer [m²/yr]. */
  readonly floorArea: Float64Array
  readonly floorAreaIfShorter: Float64Array
  readonly floorAreaIfLonger: Float64Array
  /** Σ Var A · p² [m⁴/yr²]. */
  readonly measured: Float64Array
  /** Σ E[A²] · p² [m⁴/yr²]. */
  readonly squared: Float64Array
  /** Σ E[A²] · p(1 − p) [m⁴/yr²]. */
  readonly drawn: Float64Array
}

/**
 * Expected demolition and refurbishment of standing buildings, with variance by cause.
 *
 * Each building is one draw: it comes down in one year or none. With p its chance in a year,
 *
 *     E = Σ A F̄ p,
 *     Var = Σ p²(Var A·F̄² + E[A²]·F̄²cv_b²) + Σ_f Var F (Σ A p)² + Σ E[A²] E[F²] p(1 − p) + Σ_L Var_L
 *
 * over measurement, factors f (shared), chance, and lifetimes L (shared, see
 * {@link lifetimeDoubt}). Buildings are reduced to archetypes first, so the cost does not
 * grow with the number of buildings times materials.
 *
 * Refurbishment of a component in year k is A·F·q_k·u_n with q_k the share standing after the year and u_n the
 * renewal density n years after construction; a building that comes down is not renewed in that year.
 *
 * @example
 * yearsAheadOfCells([], [], { surveyYear: 2026, horizonYears: 2, yearOffset: 0.5, unknownYears: () => [] }).expectedBuildings // => [0, 0]
 *
 * @see Müller, D. B. (2006). Stock dynamics for forecasting material flows. Ecological Economics 59, 142–156.
 */
export function yearsAheadOfCells(
  cells: readonly BuildingCell[],
  archetypes: readonly Archetype[],
  conventions: YearsAheadConventions,
): YearsAhead {
  const { horizonYears } = conventions
  const book = makeChanceBook(cells, archetypes, conventions)
  const yearly = archetypes.map(({ life }) => emptySums(horizonYears, life.lifetimeId))
  const cumulative = archetypes.map(({ life }) => emptySums(horizonYears, life.lifetimeId))
  const renewed = archetypes.map(() => new Map<Component, FlowSums>())
  const expectedBuildings = new Float64Array(horizonYears)
  let overdueBuildings = 0

  for (const cell of cells) {
    const chances = book.comingDown(cell)
    overdueBuildings += cell.buildingCount * chances.overdueShare
    for (let k = 0; k < horizonYears; k++) expectedBuildings[k]! += cell.buildingCount * chances.given[k]!
    addCell(yearly[cell.archetype]!, cell, chances.given, chances.shorter, chances.longer)
    addCell(cumulative[cell.archetype]!, cell, chances.givenSoFar, chances.shorterSoFar, chances.longerSoFar)
    addRenewals(renewed[cell.archetype]!, cell, archetypes[cell.archetype]!, book, horizonYears)
  }
  return {
    demolition: flowByMaterial(archetypes, (index) => yearly[index], horizonYears),
    cumulativeDemolition: estimateFlow(
      archetypes,
      (index) => cumulative[index],
      () => true,
      horizonYears,
    ),
    refurbishment: flowByMaterial(
      archetypes,
      (index, component) => (component === 'whole' ? undefined : renewed[index]!.get(component)),
      horizonYears,
    ),
    expectedBuildings,
    expectedFloorAreaM2: addUp(
      yearly.map(({ floorArea }) => floorArea),
      horizonYears,
    ),
    overdueBuildings,
  }
}

function emptySums(length: number, lifeId: string): FlowSums {
  const zeros = () => new Float64Array(length)
  return {
    lifeId,
    floorArea: zeros(),
    floorAreaIfShorter: zeros(),
    floorAreaIfLonger: zeros(),
    measured: zeros(),
    squared: zeros(),
    drawn: zeros(),
  }
}

function addCell(
  sums: FlowSums,
  cell: BuildingCell,
  given: Float64Array,
  shorter: Float64Array,
  longer: Float64Array,
): void {
  const { floorAreaM2, floorAreaSquaredM4, floorAreaVarianceM4 } = cell
  const expectedSquare = floorAreaSquaredM4 + floorAreaVarianceM4
  for (let k = 0; k < given.length; k++) {
    const p = given[k]!
    sums.floorArea[k]! += floorAreaM2 * p
    sums.floorAreaIfShorter[k]! += floorAreaM2 * shorter[k]!
    sums.floorAreaIfLonger[k]! += floorAreaM2 * longer[k]!
    sums.measured[k]! += floorAreaVarianceM4 * p * p
    sums.squared[k]! += expectedSquare * p * p
    // a renewal density may pass 1 a year for very short lives; chance has no variance to add then
    sums.drawn[k]! += p < 1 ? expectedSquare * p * (1 - p) : 0
  }
}

function addRenewals(
  renewed: Map<Component, FlowSums>,
  cell: BuildingCell,
  archetype: Archetype,
  book: ChanceBook,
  horizonYears: number,
): void {
  const components = new Set(archetype.factors.map(({ component }) => component))
  for (const component of components) {
    const life = component === 'whole' ? undefined : archetype.componentLives[component]
    if (component === 'whole' || !life) continue
    const renewals = book.renewals(cell, component)
    let sums = renewed.get(component)
    if (!sums) renewed.set(component, (sums = emptySums(horizonYears, life.lifetimeId)))
    addCell(sums, cell, renewals.given, renewals.shorter, renewals.longer)
  }
}

type SumsOf = (archetype: number, component: Component | 'whole') => FlowSums | undefined

function flowByMaterial(archetypes: readonly Archetype[], sumsOf: SumsOf, length: number): FlowByMaterial {
  const byMaterial = new Map<Material, FlowEstimate>()
  for (const { factors } of archetypes) {
    for (const { material } of factors) {
      if (!byMaterial.has(material))
        byMaterial.set(
          material,
          estimateFlow(archetypes, sumsOf, (candidate) => candidate === material, length),
        )
    }
  }
  return { total: estimateFlow(archetypes, sumsOf, () => true, length), byMaterial }
}

function estimateFlow(
  archetypes: readonly Archetype[],
  sumsOf: SumsOf,
  counts: (material: Material) => boolean,
  length: number,
): FlowEstimate {
  const flow = {
    meanKg: new Float64Array(length),
    lifetimeShiftKg: new Float64Array(length),
    varianceByCauseKg2: {
      measurement: new Float64Array(length),
      factor: new Float64Array(length),
      lifetime: new Float64Array(length),
      chance: new Float64Array(length),
    },
  }
  const exposureByFactor = new Map<string, Float64Array>()
  const swingByLife = new Map<string, Swing>()
  archetypes.forEach((archetype, index) => {
    for (const group of groupBySums(archetype, index, sumsOf, counts))
      addGroup(flow, exposureByFactor, swingByLife, group)
  })
  for (const exposure of exposureByFactor.values()) addSquares(flow.varianceByCauseKg2.factor, exposure)
  for (const swing of swingByLife.values()) {
    for (let k = 0; k < length; k++) {
      const { shiftKg, varianceKg2 } = lifetimeDoubt(swing.given[k]!, swing.shorter[k]!, swing.longer[k]!)
      flow.lifetimeShiftKg[k]! += shiftKg
      flow.varianceByCauseKg2.lifetime[k]! += varianceKg2
    }
  }
  return flow
}

/** A flow of one life under the life as given and one standard error shorter and longer [kg/yr]. */
interface Swing {
  readonly given: Float64Array
  readonly shorter: Float64Array
  readonly longer: Float64Array
}

interface Group {
  readonly sums: FlowSums
  readonly factors: FactorUse[]
}

/** Factors of an archetype that share one set of sums: all of them for demolition, those of a component for renewal. */
function groupBySums(
  archetype: Archetype,
  index: number,
  sumsOf: SumsOf,
  counts: (material: Material) => boolean,
): Group[] {
  const groups = new Map<FlowSums, Group>()
  for (const factor of archetype.factors) {
    const sums = counts(factor.material) ? sumsOf(index, factor.component) : undefined
    if (!sums) continue
    const group = groups.get(sums) ?? { sums, factors: [] }
    group.factors.push(factor)
    groups.set(sums, group)
  }
  return [...groups.values()]
}

function addGroup(
  flow: FlowEstimate,
  exposureByFactor: Map<string, Float64Array>,
  swingByLife: Map<string, Swing>,
  group: Group,
): void {
  const { sums } = group
  const length = flow.meanKg.length
  const spreads = spreadByFactor(group.factors)
  let [intensity, intensityVariance, betweenVariance] = [0, 0, 0]
  for (const { meanKgPerM2, sdKgPerM2, betweenSdKgPerM2 } of spreads) {
    intensity += meanKgPerM2
    intensityVariance += sdKgPerM2 ** 2
    betweenVariance += betweenSdKgPerM2 ** 2
  }
  const { measurement, chance } = flow.varianceByCauseKg2
  let swing = swingByLife.get(sums.lifeId)
  if (!swing)
    swingByLife.set(
      sums.lifeId,
      (swing = {
        given: new Float64Array(length),
        shorter: new Float64Array(length),
        longer: new Float64Array(length),
      }),
    )
  for (let k = 0; k < length; k++) {
    flow.meanKg[k]! += intensity * sums.floorArea[k]!
    measurement[k]! += intensity ** 2 * sums.measured[k]! + betweenVariance * sums.squared[k]!
    chance[k]! += (intensity ** 2 + intensityVariance + betweenVariance) * sums.drawn[k]!
    swing.given[k]! += intensity * sums.floorArea[k]!
    swing.shorter[k]! += intensity * sums.floorAreaIfShorter[k]!
    swing.longer[k]! += intensity * sums.floorAreaIfLonger[k]!
  }
  for (const { factorId, sdKgPerM2 } of spreads) {
    let exposure = exposureByFactor.get(factorId)
    if (!exposure) exposureByFactor.set(factorId, (exposure = new Float64Array(length)))
    for (let k = 0; k < length; k++) exposure[k]! += sdKgPerM2 * sums.floorArea[k]!
  }
}

function addSquares(variance: Float64Array, amount: Float64Array): void {
  for (let k = 0; k < variance.length; k++) variance[k]! += amount[k]! ** 2
}

function addUp(lists: readonly Float64Array[], length: number): Float64Array {
  const whole = new Float64Array(length)
  for (const list of lists) for (let k = 0; k < length; k++) whole[k]! += list[k]!
  return whole
}
