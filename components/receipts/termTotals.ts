import type { Receipt, ReceiptTerm } from '@/shared/schemas/receipt'

export interface TermTotal extends ReceiptTerm {
  /** Of all groups together: the counted area, and the content as their weighted mean. */
  readonly rowCount: number
}

/** Lines of all groups added up by material and part of building, heaviest first; their masses add up to the figure. */
export function termTotals(groups: Receipt['groups']): TermTotal[] {
  const totals = new Map<string, ReceiptTerm>()
  for (const term of groups.flatMap(({ terms }) => terms)) {
    const key = `${term.material}/${term.component}`
    const known = totals.get(key)
    totals.set(
      key,
      known
        ? {
            ...known,
            countedAreaM2: known.countedAreaM2 + term.countedAreaM2,
            massKg: known.massKg + term.massKg,
            rowIds: [...new Set([...known.rowIds, ...term.rowIds])],
          }
        : term,
    )
  }
  return [...totals.values()]
    .map((term) => ({
      ...term,
      contentKgPerM2: term.countedAreaM2 > 0 ? term.massKg / term.countedAreaM2 : term.contentKgPerM2,
      rowCount: term.rowIds.length,
    }))
    .sort((a, b) => b.massKg - a.massKg)
}
