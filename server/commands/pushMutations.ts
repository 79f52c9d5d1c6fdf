import { randomUUID } from 'node:crypto'
import type { z } from 'zod'
import type { Context } from '@/server/context'
import type { Scope } from '@/server/database'
import { Refusal, toProblem } from '@/server/errors'
import { deviceRevoked } from '@/server/middleware/authenticate'
import type { SignedIn } from '@/server/middleware/signedIn'
import { requireOwnDevice } from '@/server/policies/requireOwnDevice'
import { readKnownMutations, type JudgedMutation } from '@/server/queries/readKnownMutations'
import { readPushTargets } from '@/server/queries/readPushTargets'
import type { pushMutations as endpoint } from '@/shared/api/sync'
import type { MutationOutcome } from '@/shared/schemas/sync'
import { planBatch, type BatchPlan, type BatchStep } from '@/shared/sync/planBatch'
import { MIN_SYNC_SCHEMA } from '@/shared/sync/upconvertMutation'
import { applyMutation, type MutationVerdict } from './applyMutation'
import { BatchDraft, MOST_CHANGES_PER_MUTATION } from './batchDraft'
import { readBatch, type ReceivedMutation } from './readBatch'
import { retryOnContention } from './retryOnContention'
import { takeChangeNumbers } from './takeChangeNumbers'
import { writeBatch, type BatchRecord, type JudgedNow, type NumberedAgain, type Quarantined } from './writeBatch'

type Answer = z.input<typeof endpoint.response>

/**
 * Takes a batch of mutations from a device, each exactly once, in the order of their numbers. Rules P1 to P12 of the
 * protocol; everything in one transaction, and the change order is locked only for its last few statements.
 *
 * @throws {Refusal} `other-device`, `device-revoked`, `sequence-gap`, `sequence-fork`, `busy`, and those of reading a batch
 */
export async function pushMutations(
  { database, now, log }: Pick<Context, 'database' | 'now' | 'log'>,
  signedIn: SignedIn,
  body: z.output<typeof endpoint.body>,
): Promise<Answer> {
  requireOwnDevice(signedIn, body.deviceId)
  const received = readBatch(body.batch, body.schema)
  const answer = await retryOnContention(() =>
    database.withScope(signedIn, (scope) => judgeBatch(scope, { deviceId: body.deviceId, received, now: now() })),
  )
  const apartCount = answer.results.filter(({ status }) => status === 'rejected' || status === 'blocked').length
  if (apartCount > 0) log.warn({ deviceId: body.deviceId, apartCount }, 'mutations set apart')
  return { ...answer, serverTime: now().toISOString(), minSchema: MIN_SYNC_SCHEMA }
}

interface Arrival {
  readonly deviceId: string
  readonly received: readonly ReceivedMutation[]
  readonly now: Date
}

async function judgeBatch(scope: Scope, arrival: Arrival): Promise<Pick<Answer, 'results' | 'lastSeq'>> {
  const { deviceId, received } = arrival
  const before = await lockDevice(scope, deviceId)
  const known = await readKnownMutations(scope, {
    deviceId,
    ids: received.map(({ id }) => id),
    seqs: { from: received[0]?.seq ?? 0, to: Math.min(before, received.at(-1)?.seq ?? 0) },
  })
  const plan = requireOrder(planBatch(received, { lastSeq: before, ...known }))
  const freshCount = plan.steps.filter((step) => step === 'fresh').length
  const draft = await openDraft(scope, arrival, freshCount)
  const outcomes = received.map((mutation, position) =>
    judgeOne(draft, mutation, plan.steps[position] ?? 'fresh', known.byId),
  )
  if (plan.lastSeq > before) {
    await writeBatch(scope, draft, recordOf(received, plan, outcomes, before))
  }
  return {
    results: received.map((mutation, position) => present(mutation, outcomes[position]!)),
    lastSeq: plan.lastSeq,
  }
}

/** One batch of a device at a time; a lock that is not got in time gives up, so that nobody waits for ever. */
async function lockDevice(scope: Scope, deviceId: string): Promise<number> {
  await scope.execute(`SET LOCAL lock_timeout = '2s'`)
  const [device] = await scope.select<{ last_seq: string; revoked_at: Date | null }>(
    `SELECT last_seq, revoked_at FROM device
     WHERE organisation_id = $organisationId AND device_id = $deviceId AND person_id = $personId FOR NO KEY UPDATE`,
    { organisationId: scope.organisationId, personId: scope.personId, deviceId },
  )
  if (!device || device.revoked_at !== null) throw deviceRevoked()
  return Number(device.last_seq)
}

function requireOrder(plan: BatchPlan): Extract<BatchPlan, { kind: 'go' }> {
  if (plan.kind === 'go') return plan
  const isGap = plan.kind === 'gap'
  throw new Refusal(
    409,
    isGap ? 'sequence-gap' : 'sequence-fork',
    isGap
      ? `The entries before these have not come. Nothing was taken; send again from number ${plan.expected}.`
      : 'This device was restored from a copy. Nothing was taken and nothing is lost; it takes a new device number and hands in again.',
    [],
    {},
    plan.expected,
  )
}

/** Takes the lock of the change order, then reads: nothing that is read can change before the end. */
async function openDraft(scope: Scope, { deviceId, received, now }: Arrival, freshCount: number): Promise<BatchDraft> {
  const sender = { personId: scope.personId, deviceId, now }
  if (freshCount === 0) return new BatchDraft(NO_TARGETS, sender, 0)
  const first = await takeChangeNumbers(scope, freshCount * MOST_CHANGES_PER_MUTATION)
  const usable = received.flatMap(({ judgement }) => (judgement.isUsable ? [judgement.mutation] : []))
  const idsOf = (type: string) => usable.flatMap((mutation) => (mutation.type === type ? [mutation.entity] : []))
  const sheetsOfPhotos = usable.flatMap((mutation) =>
    mutation.op === 'set' && mutation.type === 'photo' ? [mutation.set.sheetId] : [],
  )
  const wanted = {
    sheetIds: [...new Set([...idsOf('sheet'), ...sheetsOfPhotos])],
    photoIds: [...new Set(idsOf('photo'))],
    conflictIds: [...new Set(idsOf('conflict'))],
  }
  return new BatchDraft(await readPushTargets(scope, wanted, now), sender, first)
}

const NO_TARGETS = {
  buildings: new Map(),
  sheets: new Map(),
  photos: new Map(),
  conflicts: new Map(),
  rejectedMakers: new Map(),
}

type Judged = MutationVerdict & { readonly step: BatchStep }

function judgeOne(
  draft: BatchDraft,
  mutation: ReceivedMutation,
  step: BatchStep,
  known: ReadonlyMap<string, JudgedMutation>,
): Judged {
  if (step === 'reused') return { step, outcome: 'rejected', problem: ID_REUSED }
  const before = known.get(mutation.id)
  if (step !== 'fresh' && before) return { step, ...verdictOf(before) }
  const { judgement } = mutation
  const verdict = judgement.isUsable
    ? applyMutation(draft, judgement.mutation)
    : ({
        outcome: 'rejected',
        problem: toProblem(
          new Refusal(422, judgement.unusable.code, judgement.unusable.detail, judgement.unusable.faults),
        ),
      } as const)
  const maker = verdict.outcome === 'rejected' ? makerOf(mutation) : null
  if (maker) draft.rejectedMakers.set(maker.entityId, mutation.id)
  return { step, ...verdict }
}

function verdictOf({ outcome, change, problem }: JudgedMutation): MutationVerdict {
  if (outcome === 'applied') return { outcome, change: change ?? 0, conflicts: [] }
  return { outcome, problem: problem ?? ID_REUSED }
}

const ID_REUSED = toProblem(
  new Refusal(
    409,
    'id-reused',
    'Other work was handed in under this number before. The entry is set apart with all it says.',
  ),
)

/** The thing that a mutation would have made, as far as that can be read. */
function makerOf({ payload }: ReceivedMutation): { entityType: string; entityId: string } | null {
  const [op, type, entity] = ['op', 'type', 'entity'].map((key): unknown => Reflect.get(payload, key))
  const isNamed = typeof type === 'string' && typeof entity === 'string' && UUID.test(entity)
  return isNamed && op === 'set' && (type === 'sheet' || type === 'photo')
    ? { entityType: type, entityId: entity }
    : null
}

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i

function recordOf(
  received: readonly ReceivedMutation[],
  plan: Extract<BatchPlan, { kind: 'go' }>,
  outcomes: readonly Judged[],
  lastSeqBefore: number,
): BatchRecord {
  const judged: JudgedNow[] = []
  const numberedAgain: NumberedAgain[] = []
  const quarantined: Quarantined[] = []
  received.forEach((mutation, position) => {
    const verdict = outcomes[position]
    if (!verdict || mutation.seq <= lastSeqBefore) return
    const { id: mutationId, seq, sha256 } = mutation
    if (verdict.step !== 'fresh') numberedAgain.push({ mutationId, seq, sha256 })
    if (verdict.step === 'fresh') judged.push({ mutationId, seq, sha256, ...remembered(verdict) })
    if (verdict.outcome !== 'applied' && (verdict.step === 'fresh' || verdict.step === 'reused')) {
      quarantined.push(setApart(mutation, verdict))
    }
  })
  return { judged, numberedAgain, quarantined, lastSeq: plan.lastSeq }
}

function remembered(verdict: MutationVerdict): Pick<JudgedNow, 'outcome' | 'change' | 'problem'> {
  if (verdict.outcome === 'applied') return { outcome: 'applied', change: verdict.change, problem: null }
  return { outcome: verdict.outcome, change: null, problem: verdict.problem }
}

function setApart(mutation: ReceivedMutation, verdict: Extract<Judged, { problem: object }>): Quarantined {
  const { judgement } = mutation
  const code = judgement.isUsable ? null : judgement.unusable.code
  const maker = verdict.outcome === 'rejected' && verdict.step === 'fresh' ? makerOf(mutation) : null
  return {
    // The id of other work is taken; this entry goes under one of ours.
    mutationId: verdict.step === 'reused' ? randomUUID() : mutation.id,
    reason: verdict.problem,
    payload: payloadToKeep(mutation, code),
    entityType: maker?.entityType ?? null,
    entityId: maker?.entityId ?? null,
  }
}

const MOST_KEPT_CHARACTERS = 200_000

/** What cannot be kept as JSON is kept as its text; what is too deep or too long to write out stays on the device. */
function payloadToKeep({ id, seq, payload }: ReceivedMutation, code: string | null): unknown {
  if (code === null || code === 'mutation-not-usable') return payload
  try {
    const text = JSON.stringify(payload)
    return text.length > MOST_KEPT_CHARACTERS ? { id, seq, keptOnDevice: true, characters: text.length } : { text }
  } catch {
    return { id, seq, keptOnDevice: true }
  }
}

function present({ id, seq }: ReceivedMutation, judged: Judged): MutationOutcome {
  if (judged.outcome !== 'applied') return { id, seq, status: judged.outcome, problem: judged.problem }
  return {
    id,
    seq,
    status: judged.step === 'fresh' ? 'applied' : 'replay',
    change: judged.change,
    ...(judged.conflicts.length > 0 ? { conflicts: [...judged.conflicts] } : {}),
    ...(judged.notice ? { problem: judged.notice } : {}),
  }
}
