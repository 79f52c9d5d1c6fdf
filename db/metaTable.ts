import type { Statements } from './driver.types'

export type MetaName =
  | 'nextSeq'
  | 'cursor'
  | 'edition'
  /** Where to look next, by round. */
  | 'nextLook'
  | 'lastHandedInAt'
  | 'scopeEpoch'
  | 'deviceId'
  /** Set while the pulled rows are fetched anew beside those that are there; its cursor, empty at the start. */
  | 'rebuildCursor'
  /** Set from the wish for another device id until the bag is numbered for it. */
  | 'isRenewing'
  /** Set once the twin of the bag was read into this database. */
  | 'isTwinned'
  /** Device id whose public key the server knows. */
  | 'keyEnrolledFor'
  /** When the bag was handed over to the stewards by a device that is shut out. */
  | 'surrenderedAt'

export async function readMeta(inside: Statements, name: MetaName): Promise<string | null> {
  const [row] = await inside.all<{ value: string }>('SELECT value FROM meta WHERE name = ?', [name])
  return row?.value ?? null
}

export async function writeMeta(inside: Statements, name: MetaName, value: string): Promise<void> {
  await inside.run(
    'INSERT INTO meta (name, value) VALUES (?, ?) ON CONFLICT (name) DO UPDATE SET value = excluded.value',
    [name, value],
  )
}

export async function removeMeta(inside: Statements, name: MetaName): Promise<void> {
  await inside.run('DELETE FROM meta WHERE name = ?', [name])
}

/** The next number of this device, taken in the transaction that uses it; numbers have no gaps. */
export async function takeSeq(inside: Statements): Promise<number> {
  const seq = Number((await readMeta(inside, 'nextSeq')) ?? '1')
  await writeMeta(inside, 'nextSeq', String(seq + 1))
  return seq
}
