import { ComputeError } from '@/shared/compute/errors'
import type { DoubtfulBuilding, ExpectedFall, WeighedKind } from './nextLook.types'

/**
 * Expected fall of a district's variance if one building were looked at, before it is known what the look will show.
 *
 * The figure of a building is G = A·m·F: its floor area, what a square metre of its kind contributes, and the errors
 * that no look at it settles (factors, lives, chance). Buildings are independent given the shared errors, so by the law
 * of total variance, with T the district's total and `a` the answer,
 *
 *     Var T − E[Var(T | a)] = Var(E[T | a]) = Var(E[G | a]).
 *
 * The shared errors drop out exactly: they widen the total as much before the look as after it, and stay. The area is
 * A = Â·U·E with 1 + cv² = (1 + s²)(1 + cv₁²): a look settles U and leaves the error cv₁ of a counted area. With w the
 * weight of a kind and m its mean content times its chance to be counted,
 *
 *     whole       Â²·[(1 + s²)·Σ w m² − (Σ w m)²]
 *     floor area  Â²·s²·(Σ w m)²
 *     others      Â²·Var(E[m | attribute])
 *
 * Area and kind are taken as independent; that the answer also teaches something of the other buildings is left out.
 *
 * @returns kg², each ≥ 0; the whole is at least the largest part
 * @throws {ComputeError} `negative-area`, `empty-input` without a kind, `share-out-of-range` when weights do not add up to 1
 * @see Goodman, L. A. (1960), Journal of the American Statistical Association 55, 708–713 (variance of products);
 *   Raiffa, H. & Schlaifer, R. (1961), Applied Statistical Decision Theory, ch. 5 (value of an observation before it is made).
 * @example
 * expectedFall({ buildingId: 'a', floorAreaM2: 10, floorAreaCv: 0, floorAreaCvAfter: 0, kinds: [{ weight: 1, use: 'office', structure: 'hybrid', constructionYear: 1980, figure: { contentKgPerM2: 9, factors: [], betweenVariance: 0, chance: 1, chanceIfShorter: 1, chanceIfLonger: 1, lifetimeId: null } }] }).wholeKg2 // => 0
 */
export function expectedFall(building: DoubtfulBuilding): ExpectedFall {
  const { floorAreaM2, kinds } = building
  requireUsable(building)
  const settled = settledAreaVariance(building)
  const mean = meanContribution(kinds)
  let square = 0
  for (const kind of kinds) square += kind.weight * contributionOf(kind) ** 2
  const scale = floorAreaM2 ** 2
  const fallOf = (attribute: 'constructionYear' | 'structure' | 'use') => scale * varianceOver(attribute, kinds, mean)
  return {
    wholeKg2: scale * Math.max(0, settled * square + (square - mean ** 2)),
    byAttributeKg2: {
      floorArea: scale * settled * mean ** 2,
      constructionYear: fallOf('constructionYear'),
      structure: fallOf('structure'),
      use: fallOf('use'),
    },
  }
}

/**
 * Mean contribution of a square metre over the possible kinds, Σ w m [kg/m²].
 *
 * @example
 * meanContribution([]) // => 0
 */
export function meanContribution(kinds: readonly WeighedKind[]): number {
  let mean = 0
  for (const kind of kinds) mean += kind.weight * contributionOf(kind)
  return mean
}

function contributionOf({ figure }: WeighedKind): number {
  return figure.contentKgPerM2 * figure.chance
}

/** s² of the part of the area's error that a look settles. */
function settledAreaVariance({ floorAreaCv, floorAreaCvAfter }: DoubtfulBuilding): number {
  return Math.max(0, (floorAreaCv ** 2 - floorAreaCvAfter ** 2) / (1 + floorAreaCvAfter ** 2))
}

function varianceOver(
  attribute: 'constructionYear' | 'structure' | 'use',
  kinds: readonly WeighedKind[],
  mean: number,
): number {
  const sums = new Map<string | number, { weight: number; contribution: number }>()
  for (const kind of kinds) {
    const sum = sums.get(kind[attribute]) ?? { weight: 0, contribution: 0 }
    sum.weight += kind.weight
    sum.contribution += kind.weight * contributionOf(kind)
    sums.set(kind[attribute], sum)
  }
  if (sums.size < 2) return 0
  let variance = 0
  for (const { weight, contribution } of sums.values())
    if (weight > 0) variance += weight * (contribution / weight - mean) ** 2
  return variance
}

function requireUsable({ buildingId, floorAreaM2, floorAreaCv, floorAreaCvAfter, kinds }: DoubtfulBuilding): void {
  if (!(floorAreaM2 > 0) || !(floorAreaCv >= 0) || !(floorAreaCvAfter >= 0))
    throw new ComputeError('negative-area', { buildingId, floorAreaM2, floorAreaCv, floorAreaCvAfter })
  if (kinds.length === 0) throw new ComputeError('empty-input', { what: 'kinds', buildingId })
  let weight = 0
  for (const kind of kinds) weight += kind.weight
  if (!(Math.abs(weight - 1) < 1e-6)) throw new ComputeError('share-out-of-range', { buildingId, weight })
}
