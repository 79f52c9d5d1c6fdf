import type { Scope } from '@/server/database'
import type { Problem } from '@/shared/schemas/problem'
import type { KnownMutation } from '@/shared/sync/planBatch'
import { uuidArray } from './uuidArray'

/** A mutation as it was judged when it came first. */
export interface JudgedMutation extends KnownMutation {
  readonly outcome: 'applied' | 'rejected' | 'blocked'
  readonly change: number | null
  readonly problem: Problem | null
}

export interface KnownMutations {
  readonly byId: ReadonlyMap<string, JudgedMutation>
  readonly bySeq: ReadonlyMap<number, KnownMutation>
}

interface Row {
  mutation_id: string
  seq: string | null
  payload_sha256: string
  outcome: JudgedMutation['outcome'] | null
  change_no: string | null
  problem: Problem | null
}

/** What is remembered of mutations, by their ids and by the numbers this device gave. */
export async function readKnownMutations(
  scope: Scope,
  { deviceId, ids, seqs }: { deviceId: string; ids: readonly string[]; seqs: { from: number; to: number } },
): Promise<KnownMutations> {
  const rows = await scope.select<Row>(
    `SELECT a.mutation_id, NULL AS seq, a.payload_sha256, a.outcome, a.change_no, a.problem
     FROM unnest($ids::uuid[]) AS n(id) CROSS JOIN LATERAL (
       SELECT * FROM applied_mutation WHERE organisation_id = $organisationId AND mutation_id = n.id LIMIT 1) a
     UNION ALL
     SELECT mutation_id, seq, payload_sha256, NULL, NULL, NULL
     FROM applied_mutation WHERE organisation_id = $organisationId AND device_id = $deviceId AND seq BETWEEN $from AND $to
     UNION ALL
     SELECT mutation_id, seq, payload_sha256, NULL, NULL, NULL
     FROM applied_sequence WHERE organisation_id = $organisationId AND device_id = $deviceId AND seq BETWEEN $from AND $to`,
    { organisationId: scope.organisationId, deviceId, ids: uuidArray(ids), from: seqs.from, to: seqs.to },
  )
  const byId = new Map<string, JudgedMutation>()
  const bySeq = new Map<number, KnownMutation>()
  for (const { mutation_id: id, payload_sha256: sha256, seq, outcome, change_no, problem } of rows) {
    if (seq !== null) bySeq.set(Number(seq), { id, sha256 })
    else if (outcome)
      byId.set(id, { id, sha256, outcome, change: change_no === null ? null : Number(change_no), problem })
  }
  return { byId, bySeq }
}
