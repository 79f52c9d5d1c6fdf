import { scaleLinear } from 'd3-scale'
import { formatMass, formatMassFigure, massUnitFor } from '@/shared/format'
import type { Tick } from './Axis'

/** A scale of masses for an upright axis. */
export interface MassScale {
  /** Height in the drawing of a mass [px]. */
  readonly yPx: (massKg: number) => number
  /** Round masses; the topmost is written with its unit. */
  readonly ticks: readonly Tick[]
}

/**
 * Upright scale from nothing to a little above the largest mass, in one unit.
 *
 * @param mostKg largest mass drawn [kg]
 * @param footPx place of nothing [px]
 * @param headPx place of the top [px], above the foot
 */
export function massScale(mostKg: number, footPx: number, headPx: number, locale: string): MassScale {
  const scale = scaleLinear()
    .domain([0, mostKg > 0 ? mostKg : 1])
    .nice(4)
    .range([footPx, headPx])
  const unit = massUnitFor([mostKg])
  const masses = mostKg > 0 ? scale.ticks(4).filter((massKg) => massKg > 0) : []
  const ticks = masses.map((massKg, place) => ({
    atPx: scale(massKg),
    label: place === masses.length - 1 ? formatMass(massKg, locale, unit) : formatMassFigure(massKg, locale, unit),
  }))
  return { yPx: (massKg) => scale(massKg), ticks }
}
