import type { z } from 'zod'
import type { Scope } from '@/server/database'
import type { listQuarantine as endpoint, QuarantineEntry } from '@/shared/api/quarantine'

type Answer = z.input<typeof endpoint.response>

interface Row extends Omit<QuarantineEntry, 'receivedAt' | 'settledAt'> {
  readonly receivedAt: Date
  readonly settledAt: Date | null
}

/** Entries of the quarantine in one state, newest first, with the building they are about where that can be read. */
export async function listQuarantine(scope: Scope, { state, limit }: z.output<typeof endpoint.query>): Promise<Answer> {
  const wanted = { organisationId: scope.organisationId, state }
  const rows = await scope.select<Row>(
    `SELECT q.mutation_id AS "mutationId", q.source, p.name AS "personName", coalesce(d.name, '') AS "deviceName",
       o.reference AS "buildingReference", q.reason, q.payload, q.received_at AS "receivedAt", q.state,
       s.name AS "settledByName", q.settled_at AS "settledAt"
     FROM quarantine q
     JOIN person p ON p.organisation_id = q.organisation_id AND p.person_id = q.person_id
     LEFT JOIN device d ON d.organisation_id = q.organisation_id AND d.device_id = q.device_id
     LEFT JOIN person s ON s.organisation_id = q.organisation_id AND s.person_id = q.settled_by
     LEFT JOIN round_building b ON b.organisation_id = q.organisation_id
       AND b.building_id::text IN (q.payload ->> 'entity', q.payload -> 'set' ->> 'sheetId')
     LEFT JOIN outline o ON o.organisation_id = b.organisation_id AND o.outline_id = b.outline_id
     WHERE q.organisation_id = $organisationId AND q.state = $state
     ORDER BY q.received_at DESC, q.mutation_id LIMIT $limit`,
    { ...wanted, limit },
  )
  const [total] = await scope.select<{ count: number }>(
    `SELECT count(*)::integer AS count FROM quarantine WHERE organisation_id = $organisationId AND state = $state`,
    wanted,
  )
  return {
    entries: rows.map((row) => ({
      ...row,
      receivedAt: row.receivedAt.toISOString(),
      settledAt: row.settledAt?.toISOString() ?? null,
    })),
    count: total?.count ?? 0,
  }
}
