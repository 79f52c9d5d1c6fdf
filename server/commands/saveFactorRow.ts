import { randomUUID } from 'node:crypto'
import type { Context } from '@/server/context'
import type { Actor, Scope } from '@/server/database'
import { notFound, unusable } from '@/server/errors'
import { kindOfPart } from '@/server/factorBook/editionToRows'
import { factorFaultText } from '@/server/factorBook/factorFaultText'
import { stableId } from '@/server/stableId'
import { FACTOR_COLUMNS, type FactorPart } from '@/shared/factorBook/factorColumns'
import { judgeAmongRows } from '@/shared/factorBook/judgeAmongRows'
import { judgeFactorRow, type RawFactorRow } from '@/shared/factorBook/judgeFactorRow'
import { lockDraftEdition } from './lockDraftEdition'
import { recordAudit } from './recordAudit'

interface RowOrder {
  readonly editionId: string
  readonly part: FactorPart
  /** Left out for a new row. */
  readonly rowId?: string
  readonly row: RawFactorRow
}

interface KnownRow {
  readonly row_id: string
  readonly content: RawFactorRow
}

/**
 * Adds a row to a draft or replaces one.
 *
 * @throws {Refusal} `not-found`, `edition-issued`, `input-not-usable` with a sentence at each field
 */
export async function saveFactorRow(
  { database }: Pick<Context, 'database'>,
  actor: Actor,
  { editionId, part, rowId, row }: RowOrder,
): Promise<{ rowId: string }> {
  return database.withScope(actor, async (scope) => {
    await lockDraftEdition(scope, editionId)
    const table = await readTable(scope, editionId, part)
    const before = table.find((known) => known.row_id === rowId)
    if (rowId !== undefined && !before) throw notFound('row of this table')
    refuseFaults(
      part,
      row,
      table.filter((known) => known !== before),
    )
    const kept = { rowId: rowId ?? randomUUID(), ...contentOf(part, row, before?.content) }
    await writeRow(scope, editionId, part, kept)
    await recordAudit(scope, {
      action: before ? 'factor-changed' : 'factor-added',
      subjectType: 'edition',
      subjectId: editionId,
      detail: { part, rowId: kept.rowId },
    })
    return { rowId: kept.rowId }
  })
}

async function readTable(scope: Scope, editionId: string, part: FactorPart): Promise<KnownRow[]> {
  return scope.select<KnownRow>(
    `SELECT row_id, content FROM factor_row
     WHERE organisation_id = $organisationId AND edition_id = $editionId AND kind = $kind`,
    { organisationId: scope.organisationId, editionId, kind: kindOfPart(part) },
  )
}

function refuseFaults(part: FactorPart, row: RawFactorRow, others: readonly KnownRow[]): void {
  const own = judgeFactorRow(part, row)
  const found =
    own.length > 0
      ? own
      : judgeAmongRows(
          part,
          row,
          others.map(({ content }) => content),
        )
  if (found.length === 0) return
  throw unusable(
    'The row was not saved. The draft is as it was; mend what is named.',
    found.map((fault) => ({ pointer: `/body/${fault.field}`, code: fault.code, detail: factorFaultText(fault) })),
  )
}

/** Only the fields of the table. A figure from another source has an error of its own. */
function contentOf(part: FactorPart, row: RawFactorRow, before: RawFactorRow | undefined): Record<string, unknown> {
  const content: Record<string, unknown> = Object.fromEntries(
    FACTOR_COLUMNS[part].map(({ field }) => {
      const value = row[field] ?? null
      return [field, typeof value === 'string' ? value.trim() || null : value]
    }),
  )
  if (part !== 'intensities') return content
  const words = ['source', 'material', 'structure', 'use', 'period', 'region'].map((field) => String(content[field]))
  const figureId = before && before['source'] === content['source'] ? before['figureId'] : stableId('figure', ...words)
  return { ...content, figureId }
}

async function writeRow(
  scope: Scope,
  editionId: string,
  part: FactorPart,
  content: { readonly rowId: string },
): Promise<void> {
  await scope.execute(
    `INSERT INTO factor_row (organisation_id, edition_id, row_id, kind, position, content)
     SELECT $organisationId, $editionId, $rowId, $kind, coalesce(max(position), -1) + 1, $content::jsonb FROM factor_row
     WHERE organisation_id = $organisationId AND edition_id = $editionId AND kind = $kind
     ON CONFLICT (organisation_id, edition_id, row_id) DO UPDATE SET content = excluded.content`,
    {
      organisationId: scope.organisationId,
      editionId,
      rowId: content.rowId,
      kind: kindOfPart(part),
      content: JSON.stringify(content),
    },
  )
}
