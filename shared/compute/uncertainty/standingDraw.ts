import type { AreaDraw } from './comingDownDraw'
import { groupMoments } from './groupMoments'
import type { MassGroup } from './massGroup.types'

/**
 * Prepares the draw of the areas of a group that stands: their independent errors together, as one lognormal with the
 * exact mean and variance of their sum.
 *
 * @remarks exact for one building of lognormal error; the nearer to the normal the more buildings there are
 * @see Fenton, L. F. (1960). The sum of log-normal probability distributions in scatter transmission systems. IRE
 *   Transactions on Communications Systems 8, 57–67.
 * @example
 * standingDraw({ factors: [], areasM2: [100, 50], areaCv: 0 })(0, seededRandom(1)) // => 150
 */
export function standingDraw(group: MassGroup): AreaDraw {
  const { meanM2, sdM2 } = groupMoments(group, null)
  if (sdM2 === 0) return () => meanM2
  const logVariance = Math.log1p((sdM2 / meanM2) ** 2)
  const [median, logSd] = [meanM2 * Math.exp(-logVariance / 2), Math.sqrt(logVariance)]
  return (_z, random) => median * Math.exp(logSd * random.normal())
}
