import { SYNC_SCHEMA } from '@/shared/schemas/sync'

/** Versions of the wire that the server still takes, oldest first: this one and two before it. */
export const MIN_SYNC_SCHEMA = Math.max(1, SYNC_SCHEMA - 2)

/** From the shape of one version to that of the next; key is the version it comes from. */
export type SchemaSteps = Readonly<Record<number, (payload: object) => object>>

const STEPS: SchemaSteps = {}

/**
 * Brings a mutation of an older app to the shape of today, version by version. What lies in the bag is never rewritten;
 * its fingerprint is taken of what was sent (rule P12).
 *
 * @param fromSchema version the phone speaks, from `MIN_SYNC_SCHEMA` to `toSchema`
 */
export function upconvertMutation(
  payload: object,
  fromSchema: number,
  steps: SchemaSteps = STEPS,
  toSchema: number = SYNC_SCHEMA,
): object {
  let current = payload
  for (let version = fromSchema; version < toSchema; version += 1) current = steps[version]?.(current) ?? current
  return current
}
