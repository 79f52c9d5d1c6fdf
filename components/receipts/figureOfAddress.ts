import { RECEIPT_KINDS, receiptFigure, type ReceiptFigure } from '@/shared/schemas/receipt'

export type Address = Readonly<Record<string, string | readonly string[] | undefined>>

/** The figure an address names; null where it names none that there is. */
export function figureOfAddress(address: Address): { runId: string; figure: ReceiptFigure } | null {
  const text = (name: string): string | null => {
    const value = address[name]
    return typeof value === 'string' && value !== '' ? value : null
  }
  const year = (name: string): number | null => (text(name) === null ? null : Number(text(name)))
  const runId = text('run')
  const figure = receiptFigure.safeParse({
    kind: text('kind') ?? RECEIPT_KINDS[0],
    material: text('material') ?? 'all',
    fromYear: year('from'),
    toYear: year('to'),
    use: text('use'),
    structure: text('structure'),
    period: text('period'),
    buildingId: text('building'),
  })
  return runId !== null && figure.success ? { runId, figure: figure.data } : null
}
