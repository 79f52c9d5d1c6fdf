import { massBand, type MassBand } from './massBand'
import type { FlowEstimate } from './yearsAheadOfCells'

/**
 * Band of the flow of one year. Flows answer to a shorter life by more than to a longer one, so the band stands
 * around the mean over the doubt of the lives, while `meanKg` stays the flow under the lives as given.
 *
 * @param year index k of the year, from 0
 * @example
 * flowBand({ meanKg: [0], lifetimeShiftKg: [0], varianceByCauseKg2: { measurement: [0], factor: [0], lifetime: [0], chance: [0] } }, 0).p90Kg // => 0
 *
 * @see Morgan, M. G. & Henrion, M. (1990). Uncertainty, ch. 8.2 (second-order propagation).
 */
export function flowBand({ meanKg, lifetimeShiftKg, varianceByCauseKg2: cause }: FlowEstimate, year: number): MassBand {
  const mean = meanKg[year]!
  if (mean === 0) return massBand(0, 0)
  const shifted = Math.max(mean / 2, mean + lifetimeShiftKg[year]!)
  // errors of factors and areas are shares of whatever the lives make the flow; draws go with its number of buildings
  const relative =
    (1 + cause.lifetime[year]! / shifted ** 2) *
      (1 + cause.factor[year]! / mean ** 2) *
      (1 + cause.measurement[year]! / mean ** 2) -
    1
  const drawn = cause.chance[year]! * (shifted / mean)
  return { ...massBand(shifted, relative * shifted ** 2 + drawn), meanKg: mean }
}
