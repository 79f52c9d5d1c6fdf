import type { EditionRows } from '@/shared/schemas/factorBook'

const KINDS = [
  ['intensity', 'intensities'],
  ['lifetime', 'lifetimes'],
  ['density', 'densities'],
  ['waste-code', 'wasteCodes'],
  ['suspicion', 'suspicions'],
] as const

export interface FactorRecord {
  readonly kind: (typeof KINDS)[number][0]
  readonly row_id: string
  readonly position: number
  readonly content: object
}

/** An edition as rows of the table `factor_row`. */
export function editionToRows(rows: EditionRows): FactorRecord[] {
  return KINDS.flatMap(([kind, part]) =>
    rows[part].map((content, position) => ({ kind, row_id: content.rowId, position, content })),
  )
}

/** Rows of the table `factor_row`, in their order → an edition, unparsed. */
export function rowsToEdition(
  records: readonly Pick<FactorRecord, 'kind' | 'content'>[],
): Record<keyof EditionRows, object[]> {
  const parts: Record<keyof EditionRows, object[]> = {
    intensities: [],
    lifetimes: [],
    densities: [],
    wasteCodes: [],
    suspicions: [],
  }
  const partOf = new Map(KINDS)
  for (const { kind, content } of records) {
    const part = partOf.get(kind)
    if (part) parts[part].push(content)
  }
  return parts
}

/** How the table `factor_row` names a part of an edition. */
export function kindOfPart(part: keyof EditionRows): FactorRecord['kind'] {
  return KINDS.find(([, name]) => name === part)![0]
}
