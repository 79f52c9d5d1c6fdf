import type { z } from 'zod'
import type { Scope } from '@/server/database'
import { presentQueueEntry, QUEUE_COLUMNS, QUEUE_TABLES, type QueueRow } from '@/server/presenters/presentQueueEntry'
import type { QueueEntry, reviewQueue } from '@/shared/api/review'

type Wish = z.output<typeof reviewQueue.query>
type Answer = z.input<typeof reviewQueue.response>

/** Sheets for review: those with most flags first, then in the order of their references. */
export async function readReviewQueue(scope: Scope, { roundId, state, limit }: Wish): Promise<Answer> {
  const wanted = { organisationId: scope.organisationId, roundId: roundId ?? null }
  const rows = await scope.select<QueueRow>(
    `SELECT ${QUEUE_COLUMNS} FROM ${QUEUE_TABLES}
     WHERE s.organisation_id = $organisationId AND s.deleted_at IS NULL
       AND ($roundId::uuid IS NULL OR s.round_id = $roundId::uuid) AND ($state::text IS NULL OR s.state = $state::text)`,
    { ...wanted, state: state ?? null },
  )
  const [counts] = await scope.select<Answer['counts']>(
    `SELECT count(*) FILTER (WHERE state = 'handed-in')::integer AS "handedIn",
       count(*) FILTER (WHERE state = 'checked')::integer AS "checked",
       count(*) FILTER (WHERE state = 'sent-back')::integer AS "sentBack"
     FROM sheet WHERE organisation_id = $organisationId AND deleted_at IS NULL
       AND ($roundId::uuid IS NULL OR round_id = $roundId::uuid)`,
    wanted,
  )
  return {
    sheets: rows.map(presentQueueEntry).sort(flagsFirst).slice(0, limit),
    counts: counts ?? { handedIn: 0, checked: 0, sentBack: 0 },
  }
}

function flagsFirst(one: QueueEntry, other: QueueEntry): number {
  return (
    other.flags.length - one.flags.length ||
    one.reference.localeCompare(other.reference, 'en', { numeric: true }) ||
    (one.sheetId < other.sheetId ? -1 : 1)
  )
}
