import type { Scope } from '@/server/database'
import type { Problem } from '@/shared/schemas/problem'
import type { KnownMutation } from '@/shared/sync/planBatch'

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
  { deviceId, ids, seqs }: { deviceId: string; ids: readonly string[]; seqs: readonly number[] },
): Promise<KnownMutations> {
  const rows = await scope.select<Row>(
    `WITH named AS (SELECT id::uuid AS id FROM json_array_elements_text($ids::json) AS n(id)),
       numbered AS (SELECT number::bigint AS seq FROM json_array_elements_text($seqs::json) AS n(number))
     SELECT a.mutation_id, NULL AS seq, a.payload_sha256, a.outcome, a.change_no, a.problem
     FROM named n JOIN applied_mutation a ON a.organisation_id = $organisationId AND a.mutation_id = n.id
     UNION ALL
     SELECT a.mutation_id, a.seq, a.payload_sha256, NULL, NULL, NULL
     FROM numbered n JOIN applied_mutation a
       ON a.organisation_id = $organisationId AND a.device_id = $deviceId AND a.seq = n.seq
     UNION ALL
     SELECT s.mutation_id, s.seq, s.payload_sha256, NULL, NULL, NULL
     FROM numbered n JOIN applied_sequence s
       ON s.organisation_id = $organisationId AND s.device_id = $deviceId AND s.seq = n.seq`,
    { organisationId: scope.organisationId, deviceId, ids: JSON.stringify(ids), seqs: JSON.stringify(seqs) },
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
