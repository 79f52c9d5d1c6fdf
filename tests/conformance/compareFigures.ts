import { ShownInPart } from './shownInPart'

/** How far a computed figure may lie from the expected one; a missing bound is 0. */
export interface Tolerance {
  readonly rel?: number
  readonly abs?: number
  readonly text?: string
  readonly note?: string
}

/** One figure that disagrees: where it stands in the expected value, what came out, what was asked for. */
export interface Disagreement {
  readonly key: string
  readonly got: unknown
  readonly expected: unknown
}

/** Keys that name a common mistake: the figure below them must not be reproduced. */
const NAMES_A_MISTAKE = /naive|wrong/i
/** Prose beside the figures, not a figure. */
const REMARK_KEYS = new Set(['note', 'notes', 'remark', 'comment'])
const PLANAR_KEY = /planar|mercator/i
const PLANAR_REL = 1e-3

/**
 * Compares a computed value with the expected one: |x − e| ≤ max(abs, rel·|e|), lists element by element,
 * objects key by key, booleans and texts exactly. Keys of the computed value that nobody asked for are ignored.
 *
 * @returns every figure that disagrees; an empty list when all agree
 */
export function compareFigures(got: unknown, expected: unknown, tolerance: Tolerance, key = ''): Disagreement[] {
  if (got instanceof ShownInPart) return compareFigures(got.figuresFor(expected), expected, tolerance, key)
  if (typeof expected === 'number') return isClose(got, expected, tolerance, key) ? [] : [{ key, got, expected }]
  if (Array.isArray(expected)) return compareLists(got, expected, tolerance, key)
  if (isRecord(expected)) return compareRecords(got, expected, tolerance, key)
  const same = typeof expected === 'string' ? isSameText(got, expected, tolerance) : got === expected
  return same ? [] : [{ key, got, expected }]
}

function isSameText(got: unknown, expected: string, { text }: Tolerance): boolean {
  return got === expected || (text !== undefined && typeof got === 'string' && meansTheSame(got, expected))
}

function isClose(got: unknown, expected: number, { rel = 0, abs = 0, note }: Tolerance, key: string): boolean {
  if (typeof got !== 'number') return false
  const planar = note !== undefined && PLANAR_KEY.test(note) && PLANAR_KEY.test(key)
  const bound = Math.max(abs, (planar ? Math.max(rel, PLANAR_REL) : rel) * Math.abs(expected))
  return Math.abs(got - expected) <= bound
}

function compareLists(got: unknown, expected: readonly unknown[], tolerance: Tolerance, key: string): Disagreement[] {
  const list = got instanceof Float64Array ? Array.from(got) : got
  if (!Array.isArray(list)) return [{ key, got, expected }]
  if (list.length !== expected.length) {
    return [{ key: `${key}.length`, got: list.length, expected: expected.length }]
  }
  return expected.flatMap((value, index) => compareFigures(list[index], value, tolerance, `${key}[${index}]`))
}

function compareRecords(
  got: unknown,
  expected: Readonly<Record<string, unknown>>,
  tolerance: Tolerance,
  key: string,
): Disagreement[] {
  const record = isRecord(got) ? got : {}
  return Object.entries(expected).flatMap(([name, value]) => {
    const path = key === '' ? name : `${key}.${name}`
    if (REMARK_KEYS.has(name)) return []
    if (NAMES_A_MISTAKE.test(name)) {
      const reproduced = name in record && compareFigures(record[name], value, tolerance, path).length === 0
      return reproduced ? [{ key: path, got: record[name], expected: 'anything but this mistake' }] : []
    }
    return compareFigures(record[name], value, tolerance, path)
  })
}

function isRecord(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value)
}

/** Same meaning in other words: at least half of the expected significant words are there. */
function meansTheSame(got: string, expected: string): boolean {
  const found = new Set(significantWords(got))
  const wanted = significantWords(expected)
  return wanted.filter((word) => found.has(word)).length * 2 >= wanted.length
}

function significantWords(text: string): string[] {
  const words = text.toLowerCase().match(/[a-z]{3,}|\d{2}/g) ?? []
  return words.map((word) => word.replace(/s$/, ''))
}
