import type { Problem } from '@/shared/schemas/problem'
import type { Statements } from './driver.types'
import { removeMeta, writeMeta } from './metaTable'

/**
 * The stewards hold what waited; here it is set apart, with all it says, and drafts stay. What was pulled belongs to the
 * organisation and leaves the device; only the change numbers of sheets that are gone stay, for a device that is let in
 * again.
 */
export async function markSurrendered(inside: Statements, sha256: string, now: Date): Promise<void> {
  const problem: Problem = {
    type: 'urn:tallystone:problem:surrendered',
    title: 'Not allowed',
    status: 403,
    code: 'surrendered',
    detail: `This was handed over to your stewards (receipt ${sha256.slice(0, 12)}).`,
    faults: [],
  }
  await inside.run(
    `INSERT INTO quarantine (mutation_id, type, building_id, payload, problem, set_apart_at)
     SELECT mutation_id, type, building_id, payload, ?, ? FROM outbox WHERE true
     ON CONFLICT (mutation_id) DO NOTHING`,
    [JSON.stringify(problem), now.toISOString()],
  )
  for (const table of ['outbox', 'base', 'base_next']) await inside.run(`DELETE FROM ${table}`)
  await removeMeta(inside, 'cursor')
  await removeMeta(inside, 'rebuildCursor')
  await writeMeta(inside, 'surrenderedAt', now.toISOString())
}
