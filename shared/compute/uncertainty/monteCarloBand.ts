import { ComputeError } from '@/shared/compute/errors'
import { chancesOf } from './chancesOf'
import type { MassGroup } from './massGroup.types'
import { percentile } from './percentile'
import { requireMassGroup } from './requireMassGroup'
import { seededRandom, type SeededRandom } from './seededRandom'
import { sharedFactorCvs } from './sharedFactorCvs'

export interface DrawnBand {
  readonly meanKg: number
  readonly sdKg: number
  readonly p10Kg: number
  readonly p50Kg: number
  readonly p90Kg: number
  readonly trials: number
  readonly seed: number
}

/** Errors of a life at which chances are worked out; between them they are interpolated. */
const FARTHEST_Z = 5
const NODES_PER_Z = 4
const NODE_COUNT = 2 * FARTHEST_Z * NODES_PER_Z + 1

/** A group made ready for many trials. */
interface PreparedGroup {
  readonly factorIndexes: readonly number[]
  readonly meansKgPerM2: readonly number[]
  readonly lifeIndex: number
  /** Chances of all buildings, node after node; empty where all stand. */
  readonly chances: Float64Array
  readonly areasM2: Float64Array
  /** (cv A)² of each building, variability and measurement together [m⁴]. */
  readonly variancesM4: Float64Array
  readonly wholeM2: number
  readonly wholeVarianceM4: number
}

/**
 * Band of a mass, stock or flow, by drawing: in each trial one draw of every shared factor and every life, then every
 * building for itself.
 *
 * The independent errors of the buildings that count in a trial are drawn together, as one lognormal with the exact mean
 * and variance of their sum: exact for one building, and the nearer to the normal the more there are.
 *
 * @param groups see {@link MassGroup}; equal ids share one draw
 * @param trials at least 2; 2 000 for P10 and P90, 20 000 bring their standard error near 0.3 % at CV 0.25
 * @param seed whole number from 0 to 2³² − 1, stored with the result: the same seed gives the same band
 * @returns band with p10Kg ≤ p50Kg ≤ p90Kg
 * @throws {ComputeError} `parameter-out-of-range`, `negative-area`, `length-mismatch`, `share-out-of-range`,
 *   `factor-ambiguous`
 * @remarks 20 000 trials of 5 000 buildings take about 0.1 s for a stock, 0.7 s for a flow on one core of 2024;
 *   memory is 41 numbers a building and 1 a trial
 * @see Morgan, M. G. & Henrion, M. (1990). Uncertainty, ch. 8; Fenton, L. F. (1960). The sum of log-normal probability
 *   distributions. IRE Transactions on Communications Systems 8, 57–67.
 * @example
 * monteCarloBand([{ factors: [{ factorId: 'f', meanKgPerM2: 800, sharedCv: 0 }], areasM2: [100], areaCv: 0 }], 2000, 1).p90Kg // => 80000
 */
export function monteCarloBand(groups: readonly MassGroup[], trials: number, seed: number): DrawnBand {
  if (!(Number.isInteger(trials) && trials >= 2)) throw new ComputeError('parameter-out-of-range', { trials })
  const factorCvs = sharedFactorCvs(groups)
  const factorLogSds = [...factorCvs.values()].map((cv) => Math.sqrt(Math.log1p(cv * cv)))
  const lifeIds = [...new Set(groups.map(lifeIdOf))]
  const prepared = groups.map((group) => prepare(group, [...factorCvs.keys()], lifeIds))
  const random = seededRandom(seed)
  const factors = new Float64Array(factorLogSds.length)
  const lives = new Float64Array(lifeIds.length)
  const totals = Float64Array.from({ length: trials }, () => {
    factorLogSds.forEach((logSd, f) => (factors[f] = Math.exp(logSd * random.normal() - (logSd * logSd) / 2)))
    lifeIds.forEach((id, life) => (lives[life] = id === null ? 0 : random.normal()))
    let total = 0
    for (const group of prepared) total += drawGroup(group, factors, lives[group.lifeIndex]!, random)
    return total
  })
  return bandOf(totals, seed)
}

function lifeIdOf({ comingDown }: MassGroup): string | null {
  return comingDown !== undefined && 'chancesAt' in comingDown ? comingDown.lifeId : null
}

function prepare(group: MassGroup, factorIds: readonly string[], lifeIds: readonly (string | null)[]): PreparedGroup {
  requireMassGroup(group)
  const { factors, areaCv, betweenBuildingsCv = 0 } = group
  const areasM2 = Float64Array.from(group.areasM2)
  const variancesM4 = areasM2.map((area, i) => {
    const cv = typeof areaCv === 'number' ? areaCv : areaCv[i]!
    return area * area * ((1 + cv * cv) * (1 + betweenBuildingsCv ** 2) - 1)
  })
  return {
    factorIndexes: factors.map(({ factorId }) => factorIds.indexOf(factorId)),
    meansKgPerM2: factors.map(({ meanKgPerM2 }) => meanKgPerM2),
    lifeIndex: lifeIds.indexOf(lifeIdOf(group)),
    chances: tabulate(group),
    areasM2,
    variancesM4,
    wholeM2: areasM2.reduce((all, area) => all + area, 0),
    wholeVarianceM4: variancesM4.reduce((all, variance) => all + variance, 0),
  }
}

function tabulate(group: MassGroup): Float64Array {
  if (group.comingDown === undefined) return new Float64Array()
  if (lifeIdOf(group) === null) return Float64Array.from(chancesOf(group, 0)!)
  const table = new Float64Array(NODE_COUNT * group.areasM2.length)
  for (let node = 0; node < NODE_COUNT; node++)
    table.set(Array.from(chancesOf(group, node / NODES_PER_Z - FARTHEST_Z)!), node * group.areasM2.length)
  return table
}

function drawGroup(group: PreparedGroup, factors: Float64Array, z: number, random: SeededRandom): number {
  const { areasM2, variancesM4, chances, factorIndexes, meansKgPerM2 } = group
  let [countedM2, varianceM4] = [group.wholeM2, group.wholeVarianceM4]
  if (chances.length > 0) {
    countedM2 = 0
    varianceM4 = 0
    const count = areasM2.length
    const isTable = chances.length > count
    const place = isTable ? (Math.min(FARTHEST_Z, Math.max(-FARTHEST_Z, z)) + FARTHEST_Z) * NODES_PER_Z : 0
    const node = isTable ? Math.min(NODE_COUNT - 2, Math.floor(place)) : 0
    const [here, next, part] = [node * count, isTable ? (node + 1) * count : 0, isTable ? place - node : 0]
    for (let i = 0; i < count; i++) {
      const chance = chances[here + i]!
      if (random.uniform() >= chance + part * (chances[next + i]! - chance)) continue
      countedM2 += areasM2[i]!
      varianceM4 += variancesM4[i]!
    }
  }
  if (countedM2 === 0) return 0
  let intensity = 0
  for (let f = 0; f < factorIndexes.length; f++) intensity += meansKgPerM2[f]! * factors[factorIndexes[f]!]!
  const logVariance = Math.log1p(varianceM4 / (countedM2 * countedM2))
  const drawn = logVariance === 0 ? 1 : Math.exp(Math.sqrt(logVariance) * random.normal() - logVariance / 2)
  return intensity * countedM2 * drawn
}

function bandOf(totals: Float64Array, seed: number): DrawnBand {
  const trials = totals.length
  const meanKg = totals.reduce((all, total) => all + total, 0) / trials
  const variance = totals.reduce((all, total) => all + (total - meanKg) ** 2, 0) / (trials - 1)
  totals.sort()
  return {
    meanKg,
    sdKg: Math.sqrt(variance),
    p10Kg: percentile(totals, 0.1),
    p50Kg: percentile(totals, 0.5),
    p90Kg: percentile(totals, 0.9),
    trials,
    seed,
  }
}
