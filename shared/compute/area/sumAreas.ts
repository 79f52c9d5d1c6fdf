import { ComputeError } from '@/shared/compute/errors'
import { sum } from '@/shared/compute/sum'
import type { BasedArea } from './area.types'

/**
 * Sum of areas that measure the same thing.
 *
 * @param areas amounts ≥ 0 [m², or m³ for volumes], at least one, all on one basis
 * @returns their sum on that basis
 * @throws {ComputeError} `mixed-area-bases` when bases differ: convert first; `empty-input`, `negative-area`
 * @example
 * sumAreas([{ amount: 100, basis: 'GFA' }, { amount: 50, basis: 'GFA' }]) // => { amount: 150, basis: 'GFA' }
 */
export function sumAreas(areas: readonly BasedArea[]): BasedArea {
  const [first] = areas
  if (first === undefined) throw new ComputeError('empty-input', { areas: 0 })
  const bases = [...new Set(areas.map(({ basis }) => basis))]
  if (bases.length > 1) throw new ComputeError('mixed-area-bases', { bases })
  const refused = areas.find(({ amount }) => !(amount >= 0))
  if (refused !== undefined) throw new ComputeError('negative-area', { ...refused })
  return { amount: sum(areas.map(({ amount }) => amount)), basis: first.basis }
}
