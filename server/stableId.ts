import { createHash } from 'node:crypto'

/**
 * Stable id of a thing from what it is, so that the same table or town gives the same ids everywhere.
 * Version 8 of RFC 9562: digest bits with the version and variant set.
 */
export function stableId(...parts: readonly (string | number | null)[]): string {
  const digest = createHash('sha256').update(JSON.stringify(parts)).digest()
  digest[6] = (digest[6]! & 0x0f) | 0x80
  digest[8] = (digest[8]! & 0x3f) | 0x80
  const hex = digest.toString('hex')
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-${hex.slice(12, 16)}-${hex.slice(16, 20)}-${hex.slice(20, 32)}`
}
