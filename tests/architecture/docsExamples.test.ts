import { readdirSync, readFileSync } from 'node:fs'
import path from 'node:path'
import { pathToFileURL } from 'node:url'
import { describe, expect, it } from 'vitest'

const FOLDER = path.join(import.meta.dirname, '..', '..', 'shared', 'compute')
const RELATIVE_TOLERANCE = 1e-9

interface Example {
  readonly expression: string
  readonly expected: string
}

const files = readdirSync(FOLDER, { recursive: true, encoding: 'utf8' })
  .filter((name) => name.endsWith('.ts') && !name.endsWith('.test.ts') && !name.endsWith('.d.ts'))
  .sort()
const examplesOf = new Map(files.map((name) => [name, readExamples(readFileSync(path.join(FOLDER, name), 'utf8'))]))
const scopeOfAll: Record<string, unknown> = {}
const scopeOf = new Map<string, Record<string, unknown>>()
const unloaded: string[] = []
for (const name of files) {
  const exported: unknown = await import(pathToFileURL(path.join(FOLDER, name)).href).catch((fault: unknown) => {
    unloaded.push(`${name}: ${String(fault)}`)
  })
  scopeOf.set(name, { ...(exported ?? {}) })
  Object.assign(scopeOfAll, exported)
}

/** Reads `expression // => value` below every `@example`; an expression may run over several lines. */
function readExamples(source: string): Example[] {
  return [...source.matchAll(/\/\*\*[\s\S]*?\*\//g)].flatMap(([comment]) => {
    const lines = comment.split('\n').map((line) => line.replace(/^\s*\/?\*+\/?\s?/, '').replace(/\s*\*\/$/, ''))
    const start = lines.findIndex((line) => line.trim().startsWith('@example'))
    return start === -1 ? [] : pairs(lines.slice(start))
  })
}

function pairs(lines: readonly string[]): Example[] {
  const found: Example[] = []
  let expression = ''
  for (const line of lines.map((text) => text.replace('@example', ''))) {
    if (line.trim().startsWith('@')) expression = ''
    const [left = '', expected] = line.split('// =>')
    expression += `${left}\n`
    if (expected === undefined) continue
    found.push({ expression: expression.trim(), expected: expected.trim() })
    expression = ''
  }
  return found
}

function evaluate(expression: string, name: string): unknown {
  const scope: Record<string, unknown> = { ...scopeOfAll, ...scopeOf.get(name) }
  // The examples are this repository's own source; running them is the point.
  return new Function(...Object.keys(scope), `"use strict"; return (${expression})`)(...Object.values(scope))
}

/** Deep equality in which numbers may differ by the rounding of the last digits written down. */
function agrees(got: unknown, expected: unknown): boolean {
  if (typeof got === 'number' && typeof expected === 'number') return isClose(got, expected)
  if (Array.isArray(expected)) {
    const list = got instanceof Float64Array ? Array.from(got) : got
    if (!Array.isArray(list) || list.length !== expected.length) return false
    return expected.every((value, index) => agrees(list[index], value))
  }
  if (!isRecord(expected) || !isRecord(got)) return Object.is(got, expected)
  const keys = new Set([...Object.keys(expected), ...Object.keys(got)])
  return [...keys].every((key) => agrees(got[key], expected[key]))
}

function isClose(got: number, expected: number): boolean {
  if (Object.is(got, expected)) return true
  return (
    Math.abs(got - expected) <= Math.max(1e-12, RELATIVE_TOLERANCE * Math.abs(expected)) || isRounded(got, expected)
  )
}

/** An example may be cut to at least six significant digits; what is written must then be the rounded figure. */
function isRounded(got: number, expected: number): boolean {
  const digits = String(Math.abs(expected)).replace(/e.*$/, '').replace('.', '').replace(/^0+/, '').length
  return digits >= 6 && Number(got.toPrecision(digits)) === expected
}

function isRecord(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null
}

describe.each(files.filter((name) => (examplesOf.get(name) ?? []).length > 0))('%s', (name) => {
  it.each(examplesOf.get(name) ?? [])('$expression gives $expected', ({ expression, expected }) => {
    const got = evaluate(expression, name)
    const wanted = evaluate(expected, name)

    expect(agrees(got, wanted), `got ${JSON.stringify(got)}`).toBe(true)
  })
})

it('loads every module', () => {
  expect(unloaded).toEqual([])
})

it('finds examples to run', () => {
  expect([...examplesOf.values()].flat().length).toBeGreaterThan(10)
})

it('has an example for every exported function', () => {
  const bare = files.filter((name) => {
    const exportsFunction = Object.values(scopeOf.get(name) ?? {}).some((value) => typeof value === 'function')
    return exportsFunction && (examplesOf.get(name) ?? []).length === 0
  })

  expect(bare).toEqual([])
})
