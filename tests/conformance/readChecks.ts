import { readFileSync } from 'node:fs'
import type { Tolerance } from './compareFigures'
import type { ConformanceCheck } from './check.types'

/**
 * Reads a check file.
 *
 * @throws {Error} the file cannot be read, is not JSON, or holds no list of checks
 */
export function readChecks(file: string): ConformanceCheck[] {
  const parsed: unknown = JSON.parse(readFileSync(file, 'utf8'))
  const list = Array.isArray(parsed) ? parsed : isRecord(parsed) ? parsed.checks : undefined
  if (!Array.isArray(list)) throw new Error(`${file} holds no list "checks".`)
  return list.map((entry: unknown, index) => readCheck(entry, index))
}

function readCheck(entry: unknown, index: number): ConformanceCheck {
  if (!isRecord(entry) || typeof entry.method !== 'string') throw new Error(`Check ${index + 1} names no method.`)
  return {
    id: typeof entry.id === 'string' ? entry.id : `check ${index + 1}`,
    method: entry.method,
    inputs: isRecord(entry.inputs) ? entry.inputs : {},
    expected: entry.expected,
    tolerance: readTolerance(entry.tolerance),
  }
}

function readTolerance(value: unknown): Tolerance {
  if (!isRecord(value)) return {}
  return {
    ...(typeof value.rel === 'number' && { rel: value.rel }),
    ...(typeof value.abs === 'number' && { abs: value.abs }),
    ...(typeof value.text === 'string' && { text: value.text }),
    ...(typeof value.note === 'string' && { note: value.note }),
  }
}

function isRecord(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value)
}
