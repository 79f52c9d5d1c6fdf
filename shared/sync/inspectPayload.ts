/** Most levels of objects and lists in a mutation, the mutation itself being the first. */
export const DEEPEST_MUTATION = 6
/** Most bytes of a mutation as JSON. */
export const LARGEST_MUTATION_BYTES = 65_536
const MOST_KEYS = 2_000

const FORBIDDEN_KEYS: ReadonlySet<string> = new Set(['__proto__', 'constructor', 'prototype'])

export type PayloadFault = 'too-deep' | 'too-many-keys' | 'forbidden-key' | 'text-not-well-formed'

/**
 * Looks through something that came as JSON before anything else touches it: how deep, how many keys, keys that would
 * reach into prototypes, and texts that a database cannot keep (NUL, half of a surrogate pair). Never recursive, so
 * depth is no danger, and it stops at the first fault.
 */
export function inspectPayload(payload: unknown): PayloadFault | null {
  const waiting: { value: unknown; depth: number }[] = [{ value: payload, depth: 1 }]
  let keyCount = 0
  for (let next = waiting.pop(); next !== undefined; next = waiting.pop()) {
    const { value, depth } = next
    if (typeof value === 'string' && !isWellFormed(value)) return 'text-not-well-formed'
    if (typeof value !== 'object' || value === null) continue
    if (depth > DEEPEST_MUTATION) return 'too-deep'
    const keys = Object.keys(value)
    keyCount += keys.length
    if (keyCount > MOST_KEYS) return 'too-many-keys'
    const fault = inspectKeys(keys)
    if (fault) return fault
    for (const key of keys) waiting.push({ value: Reflect.get(value, key), depth: depth + 1 })
  }
  return null
}

function inspectKeys(keys: readonly string[]): PayloadFault | null {
  for (const key of keys) {
    if (FORBIDDEN_KEYS.has(key)) return 'forbidden-key'
    if (!isWellFormed(key)) return 'text-not-well-formed'
  }
  return null
}

/** NUL and halves of surrogate pairs; whole pairs are looked at one by one. */
const SUSPECT = /[\0\ud800-\udfff]/

function isWellFormed(text: string): boolean {
  return !SUSPECT.test(text) || hasWholePairsOnly(text)
}

function hasWholePairsOnly(text: string): boolean {
  for (let index = 0; index < text.length; index += 1) {
    const code = text.charCodeAt(index)
    if (code === 0) return false
    if (code < 0xd800 || code > 0xdfff) continue
    const next = text.charCodeAt(index + 1)
    if (code > 0xdbff || !(next >= 0xdc00 && next <= 0xdfff)) return false
    index += 1
  }
  return true
}
