import type { FactorColumn } from '@/shared/factorBook/factorColumns'
import type { FactorFault } from '@/shared/factorBook/judgeFactorRow'
import type { Translate } from '@/shared/messages/messages.types'
import { ApiError } from '@/sync/api/ApiError'

/** A row while it is typed: a cell for each column of its table. */
export type FactorDraft = Readonly<Record<string, string | number | boolean | null>>

/** What a form begins with: the cells of a row, or the plainest answers for a new one. */
export function factorDraft(columns: readonly FactorColumn[], row?: object): FactorDraft {
  const cells = new Map<string, unknown>(row ? Object.entries(row) : [])
  return Object.fromEntries(
    columns.map(({ field, kind, choices = [] }) => {
      const known = cells.get(field)
      if (typeof known === 'string' || typeof known === 'number' || typeof known === 'boolean') return [field, known]
      if (row !== undefined) return [field, kind === 'yes-no' ? false : null]
      if (kind === 'yes-no') return [field, false]
      return [field, choices.find((choice) => choice === 'all' || choice === 'GFA') ?? null]
    }),
  )
}

/** Sentences by field, from the rules on this device. */
export function draftErrors(faults: readonly FactorFault[], t: Translate): ReadonlyMap<string, string> {
  return new Map(faults.map(({ field, code, parts }) => [field, t(`factorBook.fault.${code}`, parts)]))
}

/** Sentences by field, as the server refused them. */
export function refusedFields(error: Error | null): ReadonlyMap<string, string> {
  if (!(error instanceof ApiError)) return new Map()
  return new Map(
    error.problem.faults.flatMap(({ pointer, detail }) => {
      const [, field] = /^\/body\/(\w+)$/.exec(pointer) ?? []
      return field === undefined ? [] : [[field, detail] as const]
    }),
  )
}
