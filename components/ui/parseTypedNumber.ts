/**
 * The number a person typed, in the separators of their language or of another: `1.836,5`, `1,836.5`, `1 836,5` and
 * `1836.5` are all 1836.5.
 *
 * When a text holds both a point and a comma, the last one is the decimal. One kind alone is the decimal of the
 * language if it is that; else it separates thousands if it stands before groups of exactly three digits, and is the
 * decimal if it does not.
 *
 * @param typed what stands in the field
 * @param locale BCP 47 tag of the language in force
 * @returns the number; null for an empty field; NaN for what is no number
 */
export function parseTypedNumber(typed: string, locale: string): number | null {
  const text = typed
    .trim()
    .replace(/[\s\u00a0\u202f'’]/g, '')
    .replace(/^[−–]/, '-')
  if (text === '') return null
  const decimal = decimalOf(text, locale)
  const whole = decimal === null ? text : text.slice(0, text.lastIndexOf(decimal))
  const fraction = decimal === null ? '' : text.slice(whole.length + 1)
  const isPlain = /^-?\d*$/.test(whole) || /^-?\d{1,3}([.,])\d{3}(\1\d{3})*$/.test(whole)
  if (!isPlain || !/^\d*$/.test(fraction) || !/\d/.test(text)) return Number.NaN
  return Number(`${whole.replace(/[.,]/g, '')}.${fraction === '' ? '0' : fraction}`)
}

function decimalOf(text: string, locale: string): string | null {
  const marks = text.replace(/[^.,]/g, '')
  const last = marks.at(-1)
  if (last === undefined) return null
  if (/^(\.+,|,+\.)$/.test(marks)) return last
  if (marks.length > 1) return null
  const own = new Intl.NumberFormat(locale).formatToParts(1.5).find((part) => part.type === 'decimal')?.value
  return last !== own && /^-?\d{1,3}[.,]\d{3}$/.test(text) ? null : last
}
