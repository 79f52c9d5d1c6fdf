import { createHash } from 'node:crypto'

/** JSON with the keys of every object in order, so that equal values give equal bytes. */
export function canonicalJson(value: unknown): string {
  return JSON.stringify(value, (_key, part: unknown) =>
    typeof part === 'object' && part !== null && !Array.isArray(part)
      ? Object.fromEntries(Object.entries(part).sort(([a], [b]) => (a < b ? -1 : 1)))
      : part,
  )
}

export function sha256Of(text: string): string {
  return createHash('sha256').update(text).digest('hex')
}
