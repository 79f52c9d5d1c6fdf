import { chancesOf } from './chancesOf'
import { groupMoments } from './groupMoments'
import type { MassGroup } from './massGroup.types'
import type { SeededRandom } from './seededRandom'

/** Draws the areas of a group that count in a trial [m²], when their life is z standard errors off. */
export type AreaDraw = (z: number, random: SeededRandom) => number

/** Errors of a life at which chances are worked out; between them they are interpolated. */
const FARTHEST_Z = 5
const NODES_PER_Z = 4
const NODE_COUNT = 2 * FARTHEST_Z * NODES_PER_Z + 1
/** A sum as regular as this is drawn whole, by its mean, variance and skewness. */
const REGULAR = { skewness: 0.6, cv: 0.4 } as const
/** Buildings of like chances that are skipped over together, and the bound from which skipping costs more than looking. */
const BLOCK = 32
const DENSE = 0.2

/** Everything by node; chances and bounds node after node, buildings by falling chance. */
interface ChanceTable {
  readonly nodeCount: number
  readonly chances: Float64Array
  /** Of each block, holding up to the next node too. */
  readonly bounds: Float64Array
  readonly meansM2: Float64Array
  readonly sdsM2: Float64Array
  readonly skewnesses: Float64Array
}

/**
 * Prepares the draw of what comes down of a group of buildings.
 *
 * Where many are expected the sum is drawn whole, a normal number bent to the skewness of the sum. Where few are, each
 * building is drawn for itself, those of small chances skipped over by geometric steps of a bound and accepted with
 * chance over bound; then the errors of those drawn together as one lognormal with the mean and variance of their sum.
 *
 * @param group with chances, or a life in doubt
 * @throws {ComputeError} `length-mismatch`, `share-out-of-range`
 * @remarks exact in mean and variance for chances linear in z between nodes a quarter of a standard error apart
 * @see Devroye, L. (1986). Non-Uniform Random Variate Generation, ch. II.3 and X.2; Cornish, E. A. & Fisher, R. A. (1938).
 *   Moments and cumulants in the specification of distributions. Revue de l'Institut International de Statistique 5,
 *   307–320; Fenton, L. F. (1960). IRE Transactions on Communications Systems 8, 57–67.
 * @example
 * comingDownDraw({ factors: [], areasM2: [100, 50], areaCv: 0, comingDown: [1, 0] })(0, seededRandom(1)) // => 100
 */
export function comingDownDraw(group: MassGroup): AreaDraw {
  const usual = chancesOf(group, 0)!
  const order = Array.from(usual, (_, i) => i).sort((i, j) => usual[j]! - usual[i]!)
  const areasM2 = Float64Array.from(order, (i) => group.areasM2[i]!)
  const variancesM4 = Float64Array.from(order, (i) => errorVariance(group, i))
  const { nodeCount, chances, bounds, meansM2, sdsM2, skewnesses } = tabulate(group, order)
  const [count, blockCount] = [order.length, Math.ceil(order.length / BLOCK)]

  return (z, random) => {
    const place = nodeCount === 1 ? 0 : (Math.min(FARTHEST_Z, Math.max(-FARTHEST_Z, z)) + FARTHEST_Z) * NODES_PER_Z
    const node = Math.max(0, Math.min(nodeCount - 2, Math.floor(place)))
    const [after, part] = [Math.min(node + 1, nodeCount - 1), place - node]
    const between = (values: Float64Array) => values[node]! + part * (values[after]! - values[node]!)
    const [meanM2, sdM2, skewness] = [between(meansM2), between(sdsM2), between(skewnesses)]
    if (Math.abs(skewness) < REGULAR.skewness && sdM2 < REGULAR.cv * meanM2)
      return Math.max(0, meanM2 + sdM2 * bentNormal(skewness, random))
    let [areaM2, varianceM4] = [0, 0]
    for (let block = 0; block < blockCount; block++) {
      const bound = bounds[node * blockCount + block]!
      if (bound === 0) continue
      const stepScale = bound < DENSE ? 1 / Math.log1p(-bound) : 0
      const ceiling = bound < DENSE ? bound : 1
      const end = Math.min(count, (block + 1) * BLOCK)
      for (let i = block * BLOCK; i < end; i++) {
        if (stepScale !== 0) i += Math.floor(Math.log(1 - random.uniform()) * stepScale)
        if (i >= end) break
        const chance = chances[node * count + i]!
        if (random.uniform() * ceiling >= chance + part * (chances[after * count + i]! - chance)) continue
        areaM2 += areasM2[i]!
        varianceM4 += variancesM4[i]!
      }
    }
    return withErrors(areaM2, varianceM4, random)
  }
}

/** (cv A)² with measurement and variability together [m⁴]. */
function errorVariance({ areasM2, areaCv, betweenBuildingsCv = 0 }: MassGroup, i: number): number {
  const cv = typeof areaCv === 'number' ? areaCv : areaCv[i]!
  return areasM2[i]! ** 2 * ((1 + cv * cv) * (1 + betweenBuildingsCv ** 2) - 1)
}

function tabulate(group: MassGroup, order: readonly number[]): ChanceTable {
  const isInDoubt = group.comingDown !== undefined && 'chancesAt' in group.comingDown
  const nodeCount = isInDoubt ? NODE_COUNT : 1
  const [count, blockCount] = [order.length, Math.ceil(order.length / BLOCK)]
  const byNode = () => new Float64Array(nodeCount)
  const chances = new Float64Array(nodeCount * count)
  const [meansM2, sdsM2, skewnesses] = [byNode(), byNode(), byNode()]
  for (let node = 0; node < nodeCount; node++) {
    const atNode = chancesOf(group, isInDoubt ? node / NODES_PER_Z - FARTHEST_Z : 0)!
    order.forEach((i, place) => (chances[node * count + place] = atNode[i]!))
    const moments = groupMoments(group, atNode)
    meansM2[node] = moments.meanM2
    sdsM2[node] = moments.sdM2
    skewnesses[node] = moments.skewness
  }
  const bounds = new Float64Array(nodeCount * blockCount)
  for (let node = 0; node < nodeCount; node++) {
    const after = Math.min(node + 1, nodeCount - 1)
    for (let i = 0; i < count; i++) {
      const at = node * blockCount + Math.floor(i / BLOCK)
      bounds[at] = Math.max(bounds[at]!, chances[node * count + i]!, chances[after * count + i]!)
    }
  }
  return { nodeCount, chances, bounds, meansM2, sdsM2, skewnesses }
}

/** Mean 0, variance 1 and the skewness asked for, to first order. */
function bentNormal(skewness: number, random: SeededRandom): number {
  const z = random.normal()
  return (z + (skewness / 6) * (z * z - 1)) / Math.sqrt(1 + skewness ** 2 / 18)
}

function withErrors(areaM2: number, varianceM4: number, random: SeededRandom): number {
  if (varianceM4 === 0) return areaM2
  const logVariance = Math.log1p(varianceM4 / (areaM2 * areaM2))
  return areaM2 * Math.exp(Math.sqrt(logVariance) * random.normal() - logVariance / 2)
}
