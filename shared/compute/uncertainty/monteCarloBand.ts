import { ComputeError } from '@/shared/compute/errors'
import { comingDownDraw, type AreaDraw } from './comingDownDraw'
import type { MassGroup } from './massGroup.types'
import { percentile } from './percentile'
import { requireMassGroup } from './requireMassGroup'
import { seededRandom, type SeededRandom } from './seededRandom'
import { sharedFactorCvs } from './sharedFactorCvs'
import { standingDraw } from './standingDraw'

export interface DrawnBand {
  readonly meanKg: number
  readonly sdKg: number
  readonly p10Kg: number
  readonly p50Kg: number
  readonly p90Kg: number
  readonly trials: number
  readonly seed: number
}

/** A group made ready for many trials. */
interface PreparedGroup {
  readonly factorIndexes: readonly number[]
  readonly meansKgPerM2: readonly number[]
  readonly lifeIndex: number
  readonly drawAreaM2: AreaDraw
}

/**
 * Band of a mass, stock or flow, by drawing: in each trial one draw of every shared factor and every life, then all
 * buildings.
 *
 * What is independent from building to building is drawn as the sum over a group wherever that sum is regular, and
 * building by building where it is not: see `comingDownDraw`, `standingDraw`.
 *
 * @param groups see {@link MassGroup}; equal ids share one draw
 * @param trials at least 2; 2 000 for P10 and P90, 20 000 bring their standard error near 0.3 % at CV 0.25
 * @param seed whole number from 0 to 2³² − 1, stored with the result: the same seed gives the same band
 * @returns band with p10Kg ≤ p50Kg ≤ p90Kg
 * @throws {ComputeError} `parameter-out-of-range`, `negative-area`, `length-mismatch`, `share-out-of-range`,
 *   `factor-ambiguous`
 * @remarks 20 000 trials of 5 000 buildings in 50 groups of 8 factors take 0.2 s for a stock and 0.3 to 0.9 s for a
 *   flow on one core; memory is 41 numbers a building and 1 a trial
 * @see Morgan, M. G. & Henrion, M. (1990). Uncertainty, ch. 8.
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
  return {
    factorIndexes: group.factors.map(({ factorId }) => factorIds.indexOf(factorId)),
    meansKgPerM2: group.factors.map(({ meanKgPerM2 }) => meanKgPerM2),
    lifeIndex: lifeIds.indexOf(lifeIdOf(group)),
    drawAreaM2: group.comingDown === undefined ? standingDraw(group) : comingDownDraw(group),
  }
}

function drawGroup(group: PreparedGroup, factors: Float64Array, z: number, random: SeededRandom): number {
  const { factorIndexes, meansKgPerM2 } = group
  let intensity = 0
  for (let f = 0; f < factorIndexes.length; f++) intensity += meansKgPerM2[f]! * factors[factorIndexes[f]!]!
  return intensity * group.drawAreaM2(z, random)
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
