import { appendMutation, type Stamp } from './appendMutation'
import { buildingLabel } from './buildingLabel'
import type { Statements } from './driver.types'
import type { StoredConflict } from './fieldStore.types'
import { readColumn, type BaseRow } from './rows'

type Row = BaseRow & { readonly building_id: string; readonly building: string | null }

const OPEN = `SELECT c.id, c.change_no, c.fields, c.building_id, b.fields AS building
  FROM base AS c LEFT JOIN base AS b ON b.type = 'building' AND b.id = c.building_id
  WHERE c.type = 'conflict' AND c.fields ->> 'state' = 'open'
    AND NOT EXISTS (SELECT 1 FROM outbox WHERE outbox.type = 'conflict' AND entity_id = c.id)`

/** Conflicts nobody has settled, and none whose choice is in the bag already. */
export async function listConflicts(inside: Statements): Promise<StoredConflict[]> {
  const rows = await inside.all<Row>(`${OPEN} ORDER BY c.change_no`)
  return rows.map(({ id, fields, building, building_id }) => ({
    ...readColumn.conflict(fields),
    conflictId: id,
    label: building === null ? building_id : buildingLabel(readColumn.building(building).outline),
  }))
}

/** Puts a choice in the bag, with the change number of the conflict that was on the screen. */
export async function settleConflict(
  inside: Statements,
  { conflictId, choice }: { conflictId: string; choice: 'kept' | 'set-aside' },
  stamp: Stamp,
): Promise<void> {
  const [conflict] = await inside.all<Row>(`${OPEN} AND c.id = ?`, [conflictId])
  if (!conflict) return
  const change = {
    op: 'resolve',
    type: 'conflict',
    entity: conflictId,
    seen: conflict.change_no,
    set: { choice },
  } as const
  await appendMutation(inside, change, conflict.building_id, stamp)
}
