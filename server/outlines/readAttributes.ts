import type { Attributes, AttributeValue } from './outlines.types'

const NAME_LENGTH = 200
const TEXT_LENGTH = 500
const ATTRIBUTE_LIMIT = 100
const unsafeNames: ReadonlySet<string> = new Set(['__proto__', 'constructor', 'prototype'])

/** The attributes of a feature that hold something a table could hold; nested and empty ones are left out. */
export function readAttributes(properties: Readonly<Record<string, unknown>>): Attributes {
  const kept: [string, AttributeValue][] = []
  for (const [name, value] of Object.entries(properties)) {
    if (kept.length === ATTRIBUTE_LIMIT) break
    if (name === '' || name.length > NAME_LENGTH || unsafeNames.has(name)) continue
    const readable = asValue(value)
    if (readable !== undefined) kept.push([withoutNul(name), readable])
  }
  return Object.fromEntries(kept)
}

function asValue(value: unknown): AttributeValue | undefined {
  if (typeof value === 'number' || typeof value === 'boolean') return value
  if (typeof value !== 'string') return undefined
  const text = withoutNul(value).trim().slice(0, TEXT_LENGTH)
  return text === '' ? undefined : text
}

/** PostgreSQL keeps no NUL in text or JSON. */
function withoutNul(text: string): string {
  return text.replaceAll('\u0000', '')
}
