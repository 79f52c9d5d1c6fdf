import { ComputeError } from '@/shared/compute/errors'
import type { AreaBasis } from '@/shared/compute/factors/vocabulary'
import type { BasedArea } from './area.types'
import type { AreaRatios } from './areaConversions'

/** What a conversion may need beside the ratios. */
export interface AreaConversion extends AreaRatios {
  /** Levels counted in the gross floor area [–]; needed from and to the footprint. */
  readonly levels?: number
}

/**
 * An area on another basis, by stated ratios only: gross floor area is the middle of all ways.
 *
 * @param area amount [m², or m³ for a volume], ≥ 0, with its basis
 * @param to wanted basis
 * @param conversion ratios [–], in (0, 1]; storey height [m]; levels [–] for the footprint
 * @returns the area on the wanted basis
 * @throws {ComputeError} `negative-area`, `parameter-not-positive`, `mixed-area-bases` when levels would be needed and
 *   are not given
 * @see common practice; terms after ISO 9836 and EN 15221-6.
 * @example
 * convertArea({ amount: 810, basis: 'GFA' }, 'NFA', { netPerGross: 0.82, usablePerNet: 0.8, internalPerGross: 0.9, storeyHeightM: 2.9, provenance: 'common-practice' }) // => { amount: 664.2, basis: 'NFA' }
 */
export function convertArea(area: BasedArea, to: AreaBasis, conversion: AreaConversion): BasedArea {
  if (!(area.amount >= 0)) throw new ComputeError('negative-area', { ...area })
  if (area.basis === to) return area
  const grossM2 = area.amount / perGross(area.basis, conversion)
  return { amount: grossM2 * perGross(to, conversion), basis: to }
}

function perGross(basis: AreaBasis, conversion: AreaConversion): number {
  const ratio = ratioOf(basis, conversion)
  if (!(ratio > 0 && ratio < Infinity)) throw new ComputeError('parameter-not-positive', { basis, ratio })
  return ratio
}

function ratioOf(basis: AreaBasis, conversion: AreaConversion): number {
  const { netPerGross, usablePerNet, internalPerGross, storeyHeightM, levels } = conversion
  switch (basis) {
    case 'GFA':
      return 1
    case 'internal':
      return internalPerGross
    case 'NFA':
      return netPerGross
    case 'usable':
      return netPerGross * usablePerNet
    case 'volume':
      return storeyHeightM
    case 'footprint':
      if (levels === undefined) throw new ComputeError('mixed-area-bases', { basis, missing: 'levels' })
      return 1 / levels
  }
}
