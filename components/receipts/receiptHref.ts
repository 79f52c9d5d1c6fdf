import type { ReceiptFigure } from '@/shared/schemas/receipt'

/** What of a figure is not "all"; the rest may be left out. */
export type WantedFigure = Readonly<Partial<Record<keyof ReceiptFigure, string | number | null>>> & {
  readonly runId: string
}

const NAMES = {
  runId: 'run',
  kind: 'kind',
  material: 'material',
  fromYear: 'from',
  toYear: 'to',
  use: 'use',
  structure: 'structure',
  period: 'period',
  buildingId: 'building',
} as const

/**
 * Address of the page that explains a figure; it can be kept, sent and printed.
 *
 * @example receiptHref({ runId: 'r', kind: 'demolition', fromYear: 2027, toYear: 2036 }) // => '/receipt?run=r&kind=demolition&from=2027&to=2036'
 */
export function receiptHref(wanted: WantedFigure): string {
  const query = new URLSearchParams()
  for (const [field, name] of Object.entries(NAMES)) {
    const value: unknown = Reflect.get(wanted, field)
    if (value !== undefined && value !== null) query.set(name, String(value))
  }
  return `/receipt?${query.toString()}`
}
