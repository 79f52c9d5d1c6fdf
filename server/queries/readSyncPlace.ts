import type { Scope } from '@/server/database'
import { deviceRevoked } from '@/server/middleware/authenticate'

/** Where the organisation, the person and the device stand in one snapshot. */
export interface SyncPlace {
  readonly head: number
  /** Cursors below it are no longer served. */
  readonly floor: number
  readonly scopeEpoch: number
  readonly beatIds: readonly string[]
  /** Highest number of this device that was judged. */
  readonly lastSeq: number
}

/** @throws {Refusal} `device-revoked` */
export async function readSyncPlace(scope: Scope, deviceId: string): Promise<SyncPlace> {
  const [row] = await scope.select<{
    head: string
    floor: string
    scope_epoch: string
    last_seq: string
    beat_ids: string[] | null
  }>(
    `SELECT o.head, o.floor, p.scope_epoch, d.last_seq,
       (SELECT json_agg(b.beat_id ORDER BY b.beat_id) FROM beat b
        WHERE b.organisation_id = $organisationId AND b.surveyor_id = $personId AND b.deleted_at IS NULL) AS beat_ids
     FROM organisation o
     JOIN person p ON p.organisation_id = o.organisation_id AND p.person_id = $personId
     JOIN device d ON d.organisation_id = o.organisation_id AND d.device_id = $deviceId AND d.person_id = $personId
     WHERE o.organisation_id = $organisationId AND d.revoked_at IS NULL`,
    { organisationId: scope.organisationId, personId: scope.personId, deviceId },
  )
  if (!row) throw deviceRevoked()
  return {
    head: Number(row.head),
    floor: Number(row.floor),
    scopeEpoch: Number(row.scope_epoch),
    lastSeq: Number(row.last_seq),
    beatIds: row.beat_ids ?? [],
  }
}
