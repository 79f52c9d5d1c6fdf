/**
 * JSON with the keys of every object in one order and no spaces, so that equal values have equal texts.
 *
 * @param value what JSON can say; keys whose value is undefined are left out
 * @example
 * canonicalJson({ b: 1, a: [true, null] }) // => '{"a":[true,null],"b":1}'
 */
export function canonicalJson(value: unknown): string {
  if (typeof value !== 'object' || value === null) return JSON.stringify(value) ?? 'null'
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`
  return isRecord(value) ? canonicalObject(value) : 'null'
}

function isRecord(value: object): value is Readonly<Record<string, unknown>> {
  return !Array.isArray(value)
}

function canonicalObject(value: Readonly<Record<string, unknown>>): string {
  let text = ''
  for (const key of Object.keys(value).sort()) {
    const part = value[key]
    if (part !== undefined) text += `${text === '' ? '' : ','}${JSON.stringify(key)}:${canonicalJson(part)}`
  }
  return `{${text}}`
}
