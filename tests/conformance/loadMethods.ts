import { readdirSync } from 'node:fs'
import path from 'node:path'
import { pathToFileURL } from 'node:url'
import type { ConformanceMethod, MethodRegister } from './check.types'

const FOLDER = path.join(import.meta.dirname, 'methods')

/**
 * Gathers every export of methods/ by its name: `…Methods` is a map from method to function,
 * `…CounterExample` shows that a documented mistake is not made.
 *
 * @throws {Error} two files claim the same method
 */
export async function loadMethods(): Promise<MethodRegister> {
  const methods: Record<string, ConformanceMethod> = {}
  const counterExamples: ConformanceMethod[] = []
  const files = readdirSync(FOLDER).filter((name) => name.endsWith('.ts') && !name.endsWith('.test.ts'))
  for (const file of files.sort()) {
    const exported: unknown = await import(pathToFileURL(path.join(FOLDER, file)).href)
    for (const [name, value] of Object.entries(exported ?? {})) {
      if (name.endsWith('Methods')) addMethods(methods, value, file)
      if (name.endsWith('CounterExample') && isMethod(value)) counterExamples.push(value)
    }
  }
  return { methods, counterExamples }
}

function addMethods(methods: Record<string, ConformanceMethod>, value: unknown, file: string): void {
  for (const [method, compute] of Object.entries(value ?? {})) {
    if (!isMethod(compute)) continue
    if (methods[method] !== undefined && methods[method] !== compute) {
      throw new Error(`${file} computes "${method}" a second time; keep one of the two.`)
    }
    methods[method] = compute
  }
}

function isMethod(value: unknown): value is ConformanceMethod {
  return typeof value === 'function'
}
