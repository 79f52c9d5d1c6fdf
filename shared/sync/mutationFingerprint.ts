import { canonicalJson } from './canonicalJson'

/**
 * The text whose SHA-256 is the fingerprint of a mutation. The sequence number is left out: a device that enrols anew
 * numbers the same work afresh, and it is still the same work (rule P4).
 */
export function mutationFingerprint(mutation: object): string {
  return canonicalJson({ ...mutation, seq: undefined })
}
