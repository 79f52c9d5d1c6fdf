import { ComputeError } from '@/shared/compute/errors'
import { readUnit } from './readUnit'

/**
 * A value in another unit, by exact definitions,
 *
 *     y = x · factor(from) / factor(to)
 *
 * @param value any finite number
 * @param from unit as written in tables: `ft2`, `m²`, `lb/yd3`, `US short ton`, `kg/m2` …
 * @param to unit of the same kind
 * @returns the value in `to`
 * @throws {ComputeError} `unknown-code` a unit nobody knows; `unit-mismatch` an area into a mass;
 *   `not-a-number`
 * @see international yard and pound agreement (1959); NIST Special Publication 811 (2008), appendix B.
 * @example
 * convertUnit(1250, 'ft2', 'm2') // => 116.1288
 * convertUnit(2400, 'lb/yd3', 'kg/m3') // => 1423.863411018679
 */
export function convertUnit(value: number, from: string, to: string): number {
  if (!Number.isFinite(value)) throw new ComputeError('not-a-number', { value })
  const source = readUnit(from)
  const target = readUnit(to)
  const isSameKind = source.length === target.length && source.mass === target.mass && source.energy === target.energy
  if (!isSameKind) throw new ComputeError('unit-mismatch', { from, to })
  return (value * source.factor) / target.factor
}
