import { readFileSync } from 'node:fs'
import path from 'node:path'
import Papa from 'papaparse'

/** Rows of a factor table that ships with the product, by column name. */
export function readCsv(fileName: string): Record<string, string>[] {
  const file = path.resolve('assets/factors', fileName)
  const { data, errors } = Papa.parse<Record<string, string>>(readFileSync(file, 'utf8'), {
    header: true,
    skipEmptyLines: true,
  })
  const [first] = errors
  if (first) throw new Error(`${fileName}, row ${first.row ?? '?'}: ${first.message}`)
  return data
}

/** A number of a table cell; null when the cell says nothing. */
export function optionalNumber(cell: string | undefined): number | null {
  if (cell === undefined || cell.trim() === '') return null
  const value = Number(cell)
  return Number.isFinite(value) ? value : null
}

const PROVENANCES = {
  published: 'published',
  'open dataset': 'open-dataset',
  'common practice': 'common-practice',
  'from memory': 'from-memory',
} as const

/** Provenance as the tables write it → as the product names it. An unknown word is the least trusted kind. */
export function toProvenance(cell: string | undefined): (typeof PROVENANCES)[keyof typeof PROVENANCES] {
  return PROVENANCES[(cell ?? '').trim() as keyof typeof PROVENANCES] ?? 'from-memory'
}
