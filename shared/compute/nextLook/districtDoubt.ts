import { lifetimeDoubt } from '@/shared/compute/run/lifetimeDoubt'
import type { VarianceByCause } from '@/shared/compute/run/run.types'
import type { DoubtfulBuilding } from './nextLook.types'

/** Mean of a figure [kg] and its variance [kg²] over recorded and unrecorded buildings. */
export interface DistrictDoubt {
  readonly meanKg: number
  readonly varianceByCauseKg2: VarianceByCause
}

/**
 * Mean and variance of a figure over all buildings of a frame, those nobody has recorded yet included: for these the
 * kinds they may be stand in, each with its weight.
 *
 * With X the counted floor area of a building (its area where it is of a kind and comes down, else 0), σ_f the error of
 * a factor in it, and all three causes of doubt about X together,
 *
 *     E = Σ_i E[F̄X],
 *     Var = Σ_f (Σ_i σ_f E[X])²  +  Σ_i { E[(F̄² + Σσ² + b²)X²] − E[F̄X]² − Σ_f (σ_f E[X])² }  +  Σ_L Var_L
 *
 * over factors (shared), buildings (independent) and lives (shared, {@link lifetimeDoubt}). Of the middle term, what
 * remains when areas and kinds were known exactly, Σ Â² Σ w (F̄² + Σσ² + b²) p(1 − p), is counted as chance.
 *
 * @see Goodman, L. A. (1960). On the exact variance of products. Journal of the American Statistical Association 55, 708–713.
 * @example
 * districtDoubt([]).meanKg // => 0
 */
export function districtDoubt(buildings: readonly DoubtfulBuilding[]): DistrictDoubt {
  let [meanKg, own, chance] = [0, 0, 0]
  const exposureByFactor = new Map<string, number>()
  const swingByLife = new Map<string, [given: number, shorter: number, longer: number]>()
  for (const building of buildings) {
    const one = ownDoubt(building)
    meanKg += one.meanKg
    own += one.varianceKg2
    chance += one.chanceKg2
    for (const [factorId, exposure] of one.exposures)
      exposureByFactor.set(factorId, (exposureByFactor.get(factorId) ?? 0) + exposure)
    addSwing(swingByLife, building)
  }
  let [factor, lifetime] = [0, 0]
  for (const exposure of exposureByFactor.values()) factor += exposure ** 2
  for (const [given, shorter, longer] of swingByLife.values())
    lifetime += lifetimeDoubt(given, shorter, longer).varianceKg2
  return { meanKg, varianceByCauseKg2: { measurement: own - chance, factor, lifetime, chance } }
}

function ownDoubt({ floorAreaM2, floorAreaCv, kinds }: DoubtfulBuilding) {
  const square = floorAreaM2 ** 2 * (1 + floorAreaCv ** 2)
  const exposures = new Map<string, number>()
  let [meanKg, secondMoment, chanceKg2] = [0, 0, 0]
  for (const { weight, figure } of kinds) {
    const { contentKgPerM2, chance, factors, betweenVariance } = figure
    let spread = contentKgPerM2 ** 2 + betweenVariance
    for (const { factorId, sdKgPerM2 } of factors) {
      spread += sdKgPerM2 ** 2
      const exposure = floorAreaM2 * weight * chance * sdKgPerM2
      exposures.set(factorId, (exposures.get(factorId) ?? 0) + exposure)
    }
    meanKg += floorAreaM2 * weight * contentKgPerM2 * chance
    secondMoment += square * weight * chance * spread
    chanceKg2 += floorAreaM2 ** 2 * weight * spread * chance * (1 - chance)
  }
  let shared = 0
  for (const exposure of exposures.values()) shared += exposure ** 2
  // rounding may leave a hair below zero where nothing is in doubt
  return { meanKg, varianceKg2: Math.max(0, secondMoment - meanKg ** 2 - shared), chanceKg2, exposures }
}

function addSwing(swingByLife: Map<string, [number, number, number]>, building: DoubtfulBuilding): void {
  for (const { weight, figure } of building.kinds) {
    if (figure.lifetimeId === null) continue
    const massKg = building.floorAreaM2 * weight * figure.contentKgPerM2
    const swing = swingByLife.get(figure.lifetimeId) ?? [0, 0, 0]
    swing[0] += massKg * figure.chance
    swing[1] += massKg * figure.chanceIfShorter
    swing[2] += massKg * figure.chanceIfLonger
    swingByLife.set(figure.lifetimeId, swing)
  }
}
