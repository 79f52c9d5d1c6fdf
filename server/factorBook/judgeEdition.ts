import { FACTOR_PARTS, type FactorPart } from '@/shared/factorBook/factorColumns'
import { factorRowKey } from '@/shared/factorBook/factorRowKey'
import { judgeAmongRows } from '@/shared/factorBook/judgeAmongRows'
import { judgeFactorRow, type FactorFault } from '@/shared/factorBook/judgeFactorRow'
import type { EditionRows } from '@/shared/schemas/factorBook'

/** A fault with the row it concerns. */
export interface EditionFault extends FactorFault {
  readonly part: FactorPart
  readonly rowId: string
  readonly key: string
}

/** Everything that keeps an edition from being issued, row by row. */
export function judgeEdition(rows: EditionRows): EditionFault[] {
  const faults = FACTOR_PARTS.flatMap((part) => {
    const table: readonly { readonly rowId: string }[] = rows[part]
    const near = groupNear(part, table)
    return table.flatMap((row): EditionFault[] => {
      const raw = { ...row }
      const key = factorRowKey(part, raw)
      const others = (near.get(nearKey(part, raw)) ?? []).filter((other) => other !== row)
      return [
        ...judgeFactorRow(part, raw),
        ...judgeAmongRows(
          part,
          raw,
          others.map((other) => ({ ...other })),
        ),
      ].map((fault) => ({ ...fault, part, rowId: row.rowId, key }))
    })
  })
  const hasLife = rows.lifetimes.some(
    ({ use, structure, component }) => use === 'all' && structure === 'all' && component === 'building',
  )
  if (hasLife) return faults
  return [...faults, { field: 'component', code: 'noBuildingLife', parts: {}, part: 'lifetimes', rowId: '', key: '' }]
}

/** Rows that could be in each other's way share the first words of their key. */
function nearKey(part: FactorPart, row: Readonly<Record<string, unknown>>): string {
  return factorRowKey(part, row).split(' · ').slice(0, 2).join(' · ')
}

function groupNear<Row extends object>(part: FactorPart, table: readonly Row[]): Map<string, Row[]> {
  const groups = new Map<string, Row[]>()
  for (const row of table) {
    const key = nearKey(part, Object.fromEntries(Object.entries(row)))
    const group = groups.get(key)
    if (group) group.push(row)
    else groups.set(key, [row])
  }
  return groups
}
