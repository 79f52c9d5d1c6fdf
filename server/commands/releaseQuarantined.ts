import type { z } from 'zod'
import type { Context } from '@/server/context'
import type { Actor, Scope } from '@/server/database'
import { conflictWith, notFound, Refusal } from '@/server/errors'
import { readPushTargets } from '@/server/queries/readPushTargets'
import type { releaseQuarantined as endpoint } from '@/shared/api/quarantine'
import { SYNC_SCHEMA, type Mutation } from '@/shared/schemas/sync'
import { applyMutation } from './applyMutation'
import { BatchDraft, MOST_CHANGES_PER_MUTATION } from './batchDraft'
import { readBatch, type ReceivedMutation } from './readBatch'
import { recordAudit } from './recordAudit'
import { retryOnContention } from './retryOnContention'
import { takeChangeNumbers } from './takeChangeNumbers'
import { writeBatch } from './writeBatch'

type Answer = z.input<typeof endpoint.response>

/**
 * Lets work that was set apart count: through the same judging and merging as when a device hands in, in the name of who
 * recorded it, on any building of the organisation because a steward answers for it, and once, whatever comes later under
 * the same id. Nothing is changed when it still cannot be used.
 *
 * @throws {Refusal} `not-found`, `already-settled`, `busy`, and why it cannot be used
 */
export async function releaseQuarantined(
  { database, now }: Pick<Context, 'database' | 'now'>,
  actor: Actor,
  mutationId: string,
  { set }: { set?: Readonly<Record<string, unknown>> | undefined },
): Promise<Answer> {
  return retryOnContention(() =>
    database.withScope(actor, async (scope) => {
      await scope.execute(`SET LOCAL lock_timeout = '2s'`)
      const entry = await lockWaiting(scope, mutationId)
      const before = await outcomeBefore(scope, mutationId)
      const isApplied = before?.outcome === 'applied'
      const change = isApplied ? before.change : await apply(scope, entry, set, now())
      await markReleased(scope, mutationId, now())
      await recordAudit(scope, {
        action: 'quarantine-released',
        subjectType: 'mutation',
        subjectId: mutationId,
        detail: { isMended: set !== undefined, isApplied },
      })
      return { outcome: isApplied ? ('already-applied' as const) : ('applied' as const), change }
    }),
  )
}

interface WaitingEntry {
  readonly mutation_id: string
  readonly device_id: string
  readonly person_id: string
  readonly payload: unknown
  readonly state: string
}

/** @throws {Refusal} `not-found`, `already-settled` */
export async function lockWaiting(scope: Scope, mutationId: string): Promise<WaitingEntry> {
  const [entry] = await scope.select<WaitingEntry>(
    `SELECT mutation_id, device_id, person_id, payload, state FROM quarantine
     WHERE organisation_id = $organisationId AND mutation_id = $mutationId FOR UPDATE`,
    { organisationId: scope.organisationId, mutationId },
  )
  if (!entry) throw notFound('entry of the quarantine')
  if (entry.state !== 'waiting') {
    throw conflictWith('already-settled', 'Somebody decided on this entry before. Nothing was changed.')
  }
  return entry
}

async function outcomeBefore(scope: Scope, mutationId: string) {
  const [row] = await scope.select<{ outcome: string; change_no: string | null }>(
    `SELECT outcome, change_no FROM applied_mutation
     WHERE organisation_id = $organisationId AND mutation_id = $mutationId`,
    { organisationId: scope.organisationId, mutationId },
  )
  return row && { outcome: row.outcome, change: row.change_no === null ? null : Number(row.change_no) }
}

async function apply(
  scope: Scope,
  entry: WaitingEntry,
  set: Readonly<Record<string, unknown>> | undefined,
  now: Date,
): Promise<number> {
  const { mutation, sha256 } = requireUsable(entry, set)
  const author: Scope = { ...scope, personId: entry.person_id }
  const first = await takeChangeNumbers(author, MOST_CHANGES_PER_MUTATION)
  const targets = await readPushTargets(author, wantedBy(mutation), now)
  const buildings = new Map([...targets.buildings].map(([id, building]) => [id, { ...building, isAllowed: true }]))
  // A writer of its own: as the device's it would go over what the device wrote since, without asking.
  const sender = { personId: entry.person_id, deviceId: entry.mutation_id, now }
  const draft = new BatchDraft({ ...targets, buildings }, sender, first)
  // its own making is what is being decided on
  draft.rejectedMakers.delete(mutation.entity)
  const verdict = applyMutation(draft, mutation)
  if (verdict.outcome !== 'applied') {
    const { status, code, detail, faults } = verdict.problem
    throw new Refusal(status === 403 ? 422 : status, code, detail, faults)
  }
  await writeBatch(author, draft, { judged: [], numberedAgain: [], quarantined: [], lastSeq: 0 })
  await nameAuthor(author, draft)
  await rememberApplied(scope, entry, sha256, verdict.change)
  return verdict.change
}

type Usable = { readonly mutation: Mutation; readonly sha256: string }

/** The fingerprint is that of what the device sent, so that it is known again when it comes from there. */
function requireUsable(
  { mutation_id: id, payload }: WaitingEntry,
  set: Readonly<Record<string, unknown>> | undefined,
): Usable {
  const sent = { seq: 1, ...(typeof payload === 'object' && payload !== null ? payload : {}), id }
  const asSent = readOne(sent)
  const { judgement } = set === undefined ? asSent : readOne({ ...sent, set })
  if (judgement.isUsable) return { mutation: judgement.mutation, sha256: asSent.sha256 }
  const { code, detail, faults } = judgement.unusable
  throw new Refusal(422, code, detail, faults)
}

function readOne(payload: object): ReceivedMutation {
  const [one] = readBatch([payload], SYNC_SCHEMA)
  if (!one) throw new Error('a batch of one has one entry')
  return one
}

function wantedBy(mutation: Mutation) {
  const isOf = (type: Mutation['type']) => (mutation.type === type ? [mutation.entity] : [])
  const sheetOfPhoto = mutation.op === 'set' && mutation.type === 'photo' ? [mutation.set.sheetId] : []
  return { sheetIds: [...isOf('sheet'), ...sheetOfPhoto], photoIds: isOf('photo'), conflictIds: isOf('conflict') }
}

/** Conflicts name people by their devices; this writer is none. */
async function nameAuthor(scope: Scope, draft: BatchDraft): Promise<void> {
  const { deviceId, personId } = draft.sender
  const named = draft.conflictWrites.map(({ conflictId, keptDevice }) => ({
    conflictId,
    isKept: keptDevice === deviceId,
  }))
  if (named.length === 0) return
  await scope.execute(
    `UPDATE conflict c SET kept_by = CASE WHEN r."isKept" THEN $personId::uuid ELSE c.kept_by END,
       set_aside_by = CASE WHEN r."isKept" THEN c.set_aside_by ELSE $personId::uuid END
     FROM json_to_recordset($named::json) AS r("conflictId" uuid, "isKept" boolean)
     WHERE c.organisation_id = $organisationId AND c.conflict_id = r."conflictId"`,
    { organisationId: scope.organisationId, personId, named: JSON.stringify(named) },
  )
}

/** What no device numbered gets the negative of its change number, which no device can give. */
async function rememberApplied(scope: Scope, entry: WaitingEntry, sha256: string, change: number): Promise<void> {
  await scope.execute(
    `INSERT INTO applied_mutation (organisation_id, mutation_id, device_id, seq, payload_sha256, outcome, change_no)
     VALUES ($organisationId, $mutationId, $deviceId, $seq, $sha256, 'applied', $change)
     ON CONFLICT (organisation_id, mutation_id) DO UPDATE SET outcome = 'applied', change_no = excluded.change_no,
       problem = NULL`,
    {
      organisationId: scope.organisationId,
      mutationId: entry.mutation_id,
      deviceId: entry.device_id,
      seq: -change,
      sha256,
      change,
    },
  )
}

async function markReleased(scope: Scope, mutationId: string, now: Date): Promise<void> {
  await scope.execute(
    `UPDATE quarantine SET state = 'released', settled_by = $personId, settled_at = $now
     WHERE organisation_id = $organisationId AND mutation_id = $mutationId`,
    { organisationId: scope.organisationId, personId: scope.personId, mutationId, now },
  )
}
