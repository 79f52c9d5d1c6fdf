import type { Scope } from '@/server/database'
import type { SyncDigest } from '@/shared/sync/syncDigest'
import { uuidArray } from './uuidArray'

/** Digest of everything that is there in some beats: the same figure as `syncDigest` of what the device holds. */
export async function readSyncDigest(scope: Scope, beatIds: readonly string[]): Promise<SyncDigest> {
  const [row] = await scope.select<SyncDigest>(DIGEST, {
    organisationId: scope.organisationId,
    beatIds: uuidArray(beatIds),
  })
  return row ?? { count: 0, xor64: '0'.repeat(16) }
}

const branch = (table: string, key: string, hasTombstones: boolean) => `
  SELECT ${key} AS id, change_no FROM ${table}
  WHERE organisation_id = $organisationId AND beat_id = ANY ($beatIds::uuid[])
    ${hasTombstones ? 'AND deleted_at IS NULL' : ''}`

const DIGEST = `
  SELECT count(*)::integer AS count,
    lpad(to_hex(coalesce(bit_xor(
      ('x' || left(encode(sha256(convert_to(id::text || ':' || change_no, 'UTF8')), 'hex'), 16))::bit(64)::bigint
    ), 0)), 16, '0') AS xor64
  FROM (${branch('beat', 'beat_id', true)}
    UNION ALL ${branch('round_building', 'building_id', false)}
    UNION ALL ${branch('sheet', 'sheet_id', true)}
    UNION ALL ${branch('photo', 'photo_id', true)}
    UNION ALL ${branch('conflict', 'conflict_id', false)}) AS held`
