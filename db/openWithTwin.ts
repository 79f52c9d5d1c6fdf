import type { Driver, Statements } from './driver.types'
import { readMeta, writeMeta } from './metaTable'
import { migrate } from './migrate'
import { readColumn, type OutboxRow } from './rows'
import type { Twin, TwinEntry } from './twin.types'

export interface OpenedWithTwin {
  readonly driver: Driver
  /** Mutations that came back from the twin or out of a damaged database; 0 in peace. */
  readonly recoveredCount: number
}

/**
 * Opens the database, and sees first whether it is sound. One that is damaged is left where it is and another is begun;
 * one that is new although its twin holds work gets that work back, with the same mutation ids, so that nothing is
 * applied twice (the numbers begin at 1, which the server answers as for a phone that was restored, P4).
 *
 * @param open by the number of databases that were given up
 * @throws whatever opening throws that is no damage
 */
export async function openWithTwin(open: (generation: number) => Promise<Driver>, twin: Twin): Promise<OpenedWithTwin> {
  const generation = await twin.readGeneration()
  const first = await openSound(() => open(generation))
  const driver = first.driver ?? (await begin(open, twin, generation + 1))
  try {
    const recoveredCount = await recover(driver, [...first.salvaged, ...(await twin.all())])
    await twin.put(await bagOf(driver))
    await twin.keepOnly(await idsToKeep(driver))
    return { driver, recoveredCount }
  } catch (error) {
    await driver.close()
    throw error
  }
}

/** Mutations the twin must hold: those in the bag and those that were refused. */
export async function idsToKeep(inside: Statements): Promise<ReadonlySet<string>> {
  const rows = await inside.all<{ id: string }>(
    'SELECT mutation_id AS id FROM outbox UNION SELECT mutation_id FROM quarantine',
  )
  return new Set(rows.map(({ id }) => id))
}

/** The number is written down before the new database: breaking off in between opens it again, empty, and recovers. */
async function begin(open: (generation: number) => Promise<Driver>, twin: Twin, generation: number): Promise<Driver> {
  await twin.writeGeneration(generation)
  const driver = await open(generation)
  await migrate(driver)
  return driver
}

interface Sound {
  /** Null when the database is damaged. */
  readonly driver: Driver | null
  readonly salvaged: readonly TwinEntry[]
}

async function openSound(open: () => Promise<Driver>): Promise<Sound> {
  let driver: Driver
  try {
    driver = await open()
  } catch (error) {
    if (!isDamage(error)) throw error
    return { driver: null, salvaged: [] }
  }
  try {
    const [verdict] = await driver.all<Record<string, string>>('PRAGMA quick_check(1)')
    if (Object.values(verdict ?? {})[0] === 'ok') {
      await migrate(driver)
      return { driver, salvaged: [] }
    }
  } catch (error) {
    if (!isDamage(error)) {
      await driver.close()
      throw error
    }
  }
  const salvaged = await bagOf(driver).catch(() => [])
  // what cannot be closed any more goes with the page
  await driver.close().catch(() => undefined)
  return { driver: null, salvaged }
}

function isDamage(error: unknown): boolean {
  return error instanceof Error && /malformed|not a database|SQLITE_CORRUPT|SQLITE_NOTADB|corrupt/i.test(error.message)
}

async function bagOf(inside: Statements): Promise<TwinEntry[]> {
  const rows = await inside.all<OutboxRow>('SELECT * FROM outbox ORDER BY seq')
  return rows.map(({ mutation_id, seq, building_id, put_in_at, payload }) => ({
    mutationId: mutation_id,
    seq,
    buildingId: building_id,
    putInAt: put_in_at,
    payload,
  }))
}

/** Only a database that never was a person's takes work back: in one that was, what is missing had been confirmed. */
async function recover(driver: Driver, entries: readonly TwinEntry[]): Promise<number> {
  return driver.transaction(async (inside) => {
    if ((await readMeta(inside, 'isTwinned')) !== null) return 0
    await writeMeta(inside, 'isTwinned', '1')
    if (Number((await readMeta(inside, 'nextSeq')) ?? '1') > 1) return 0
    const unique = [...new Map(entries.map((entry) => [entry.mutationId, entry])).values()]
    unique.sort((one, other) => one.seq - other.seq)
    for (const [index, entry] of unique.entries()) await putBack(inside, entry, index + 1)
    if (unique.length > 0) await writeMeta(inside, 'nextSeq', String(unique.length + 1))
    return unique.length
  })
}

async function putBack(inside: Statements, entry: TwinEntry, seq: number): Promise<void> {
  const mutation = {
    ...(JSON.parse(entry.payload) as { type: string; op: string; entity: string; set?: unknown }),
    seq,
  }
  await inside.run(
    'INSERT INTO outbox (mutation_id, seq, type, entity_id, building_id, payload, put_in_at) VALUES (?, ?, ?, ?, ?, ?, ?)',
    [entry.mutationId, seq, mutation.type, mutation.entity, entry.buildingId, JSON.stringify(mutation), entry.putInAt],
  )
  if (mutation.type !== 'photo' || mutation.op !== 'set') return
  const meta = JSON.stringify(mutation.set)
  await inside.run("INSERT OR IGNORE INTO photo (photo_id, sheet_id, meta, place) VALUES (?, ?, ?, 'kept-here')", [
    mutation.entity,
    readColumn.photoMeta(meta).sheetId,
    meta,
  ])
}
