import type { Context } from '@/server/context'
import type { Actor, Scope } from '@/server/database'
import { unusable } from '@/server/errors'
import { factorFaultText } from '@/server/factorBook/factorFaultText'
import { judgeEdition } from '@/server/factorBook/judgeEdition'
import { readEditions, readFullEdition } from '@/server/queries/readEditions'
import type { Edition } from '@/shared/schemas/factorBook'
import { lockDraftEdition } from './lockDraftEdition'
import { recordAudit } from './recordAudit'

/** Most faults that are named at once. */
const NAMED_FAULTS = 100

interface IssueOrder {
  readonly editionId: string
  readonly number: number
  readonly note: string
}

/**
 * Issues a draft: from then on runs may use it, phones get it, and nothing in it changes.
 *
 * @throws {Refusal} `not-found`, `edition-issued`, `input-not-usable` with each fault of each row
 */
export async function issueEdition(
  { database, now }: Pick<Context, 'database' | 'now'>,
  actor: Actor,
  { editionId, number, note }: IssueOrder,
): Promise<Edition> {
  return database.withScope(actor, async (scope) => {
    const { organisationId, personId } = scope
    await lockDraftEdition(scope, editionId)
    await refuseNumber(scope, editionId, number)
    await refuseFaultyRows(scope, editionId)
    await scope.execute(
      `UPDATE edition SET number = $number, note = $note, state = 'issued', issued_at = $now, issued_by = $personId
       WHERE organisation_id = $organisationId AND edition_id = $editionId`,
      { organisationId, personId, editionId, number, note, now: now() },
    )
    await recordAudit(scope, {
      action: 'edition-issued',
      subjectType: 'edition',
      subjectId: editionId,
      detail: { number },
    })
    const [edition] = await readEditions(scope, editionId)
    return edition!
  })
}

/** Phones take the highest issued number for the newest edition. */
async function refuseNumber(scope: Scope, editionId: string, number: number): Promise<void> {
  const others = (await readEditions(scope)).filter((edition) => edition.editionId !== editionId)
  const highest = Math.max(0, ...others.filter(({ state }) => state === 'issued').map((edition) => edition.number))
  const detail =
    number <= highest
      ? `Edition ${highest} is issued already; take a number above ${highest}.`
      : others.some((other) => other.number === number)
        ? `Another draft has the number ${number}; take another number.`
        : null
  if (detail === null) return
  throw unusable('The draft was not issued, because its number cannot be used. Nothing was changed.', [
    { pointer: '/body/number', code: 'number-taken', detail },
  ])
}

async function refuseFaultyRows(scope: Scope, editionId: string): Promise<void> {
  const { rows } = await readFullEdition(scope, editionId)
  const faults = judgeEdition(rows)
  if (faults.length === 0) return
  throw unusable(
    `The draft was not issued: ${faults.length} ${faults.length === 1 ? 'fault stands' : 'faults stand'} in its rows. Nothing was changed; mend them and issue it again.`,
    faults.slice(0, NAMED_FAULTS).map((fault) => ({
      pointer: `/rows/${fault.part}/${fault.rowId}/${fault.field}`,
      code: fault.code,
      detail: fault.key === '' ? factorFaultText(fault) : `${fault.key}: ${factorFaultText(fault)}`,
    })),
  )
}
