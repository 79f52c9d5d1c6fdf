import type { Mutation } from '@/shared/schemas/sync'
import type { Statements } from './driver.types'
import { takeSeq } from './metaTable'
import type { TwinEntry } from './twin.types'

type WithoutNumber<Kind> = Kind extends Mutation ? Omit<Kind, 'id' | 'seq' | 'at' | 'elapsedMs'> : never

/** A mutation before it has its identities. */
export type NewMutation = WithoutNumber<Mutation>

export interface Stamp {
  readonly newId: () => string
  readonly now: () => Date
  /** Milliseconds since the app started. */
  readonly elapsedMs: () => number
  /** Told of every mutation that was written, within its transaction. */
  readonly onAppended?: (entry: TwinEntry) => void
}

/** Writes a mutation into the bag, with its own id and the next number of the device. */
export async function appendMutation(
  inside: Statements,
  change: NewMutation,
  buildingId: string,
  stamp: Stamp,
): Promise<void> {
  const seq = await takeSeq(inside)
  const at = stamp.now().toISOString()
  const mutation = { ...change, id: stamp.newId(), seq, at, elapsedMs: Math.round(stamp.elapsedMs()) }
  const payload = JSON.stringify(mutation)
  await inside.run(
    'INSERT INTO outbox (mutation_id, seq, type, entity_id, building_id, payload, put_in_at) VALUES (?, ?, ?, ?, ?, ?, ?)',
    [mutation.id, seq, mutation.type, mutation.entity, buildingId, payload, at],
  )
  stamp.onAppended?.({ mutationId: mutation.id, seq, buildingId, putInAt: at, payload })
}
