import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import Database from 'better-sqlite3'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { memoryTwin, type MemoryTwin } from '@/tests/support/memoryTwin'
import { memoryDriver } from '@/tests/support/memoryDriver'
import { appendMutation } from './appendMutation'
import type { Driver } from './driver.types'
import { newId } from './newId'
import { openWithTwin } from './openWithTwin'
import { saveSafely } from './saveSafely'

const stamp = { newId: () => newId(), now: () => new Date('2026-10-13T14:08:00Z'), elapsedMs: () => 5 }
const BUILDING = '01980000-0000-7000-8000-0000000000a1'

let folder: string
let twin: MemoryTwin
beforeEach(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'twin-'))
  twin = memoryTwin()
})
afterEach(() => rm(folder, { recursive: true, force: true }))

const fileOf = (generation: number) => path.join(folder, `${generation}.db`)
const open = async (generation: number): Promise<Driver> => memoryDriver(fileOf(generation))

async function record(driver: Driver, count: number): Promise<void> {
  const save = saveSafely(driver, twin, stamp)
  for (let turn = 0; turn < count; turn += 1) {
    const set = { notes: { text: `note ${turn} ${'x'.repeat(600)}` } }
    await save((inside, own) =>
      appendMutation(inside, { op: 'set', type: 'sheet', entity: BUILDING, seen: 0, set }, BUILDING, own),
    )
  }
}
const bag = (driver: Driver) =>
  driver.all<{ mutation_id: string; seq: number; payload: string }>(
    'SELECT mutation_id, seq, payload FROM outbox ORDER BY seq',
  )

/** Ids that were ever called saved are all in the bag, with numbers from 1 without a gap. */
async function assertNothingLost(driver: Driver, ids: readonly string[]): Promise<void> {
  const rows = await bag(driver)
  expect(rows.map(({ mutation_id }) => mutation_id)).toEqual(ids)
  expect(rows.map(({ seq }) => seq)).toEqual(ids.map((_, index) => index + 1))
  expect(rows.map(({ payload }) => (JSON.parse(payload) as { seq: number }).seq)).toEqual(rows.map(({ seq }) => seq))
}

describe('openWithTwin', () => {
  it('changes nothing about a sound database, and brings a twin level that had stayed behind', async () => {
    const { driver } = await openWithTwin(open, twin)
    await record(driver, 3)
    const ids = (await bag(driver)).map(({ mutation_id }) => mutation_id)
    twin.texts.delete(ids[1]!)
    await driver.close()

    const again = await openWithTwin(open, twin)

    expect([again.recoveredCount, twin.texts.size]).toEqual([0, 3])
    await assertNothingLost(again.driver, ids)
  })

  it('F15 takes every saved mutation back, with the same ids, when the database is gone', async () => {
    const { driver } = await openWithTwin(open, twin)
    await record(driver, 5)
    const ids = (await bag(driver)).map(({ mutation_id }) => mutation_id)
    await driver.close()
    await rm(fileOf(0))

    const again = await openWithTwin(open, twin)

    expect(again.recoveredCount).toBe(5)
    await assertNothingLost(again.driver, ids)
  })

  it.each([
    ['its first bytes are others', 0],
    ['a page in the middle is overwritten', 8_192],
    ['half of it is overwritten', 4_096],
  ])('F15 begins another database and takes the work back when %s', async (_, from) => {
    const { driver } = await openWithTwin(open, twin)
    await record(driver, 40)
    const ids = (await bag(driver)).map(({ mutation_id }) => mutation_id)
    await driver.close()
    const bytes = await readFile(fileOf(0))
    bytes.fill(0xa5, from, from === 8_192 ? from + 4_096 : bytes.length)
    await writeFile(fileOf(0), bytes)

    const again = await openWithTwin(open, twin)

    expect([again.recoveredCount, await twin.readGeneration()]).toEqual([40, 1])
    await assertNothingLost(again.driver, ids)
    expect(await readFile(fileOf(0))).toEqual(bytes)
    await again.driver.close()
    await assertNothingLost((await openWithTwin(open, twin)).driver, ids)
  })

  it('F15 is found out when the twin is broken on purpose', async () => {
    const { driver } = await openWithTwin(open, twin)
    const forgetful = { ...twin, put: async () => {} }
    await saveSafely(
      driver,
      forgetful,
      stamp,
    )((inside, own) =>
      appendMutation(inside, { op: 'delete', type: 'sheet', entity: BUILDING, seen: 0 }, BUILDING, own),
    )
    const ids = (await bag(driver)).map(({ mutation_id }) => mutation_id)
    await driver.close()
    await rm(fileOf(0))

    const again = await openWithTwin(open, twin)

    await expect(assertNothingLost(again.driver, ids)).rejects.toThrow()
  })

  it('leaves out entries of the twin that were cut or changed', async () => {
    const { driver } = await openWithTwin(open, twin)
    await record(driver, 3)
    const [one, two, three] = (await bag(driver)).map(({ mutation_id }) => mutation_id)
    twin.texts.set(one!, twin.texts.get(one!)!.replace('note 0', 'note 9'))
    twin.texts.set(two!, twin.texts.get(two!)!.slice(0, 80))

    const again = await openWithTwin(async () => memoryDriver(), twin)

    expect((await bag(again.driver)).map(({ mutation_id }) => mutation_id)).toEqual([three])
  })

  it('takes nothing back that was confirmed meanwhile', async () => {
    const { driver } = await openWithTwin(open, twin)
    await record(driver, 2)
    await driver.run('DELETE FROM outbox')
    await driver.close()

    const again = await openWithTwin(open, twin)

    expect([again.recoveredCount, twin.texts.size]).toEqual([0, 0])
  })

  it('F13 saves on the space that was held back when the disk is full, once', async () => {
    const database = new Database(fileOf(0))
    database.close()
    const { driver } = await openWithTwin(open, twin)
    await twin.holdBallast()
    let isFull = true
    const full: Driver = {
      ...driver,
      transaction: async (work) => {
        if (isFull && twin.hasBallast()) throw new Error('database or disk is full')
        if (isFull && !twin.hasBallast()) isFull = false
        return driver.transaction(work)
      },
    }
    const save = saveSafely(full, twin, stamp)
    const set = { notes: { text: 'the last one' } }
    const entry = { op: 'set', type: 'sheet', entity: BUILDING, seen: 0, set } as const
    await save((inside, own) => appendMutation(inside, entry, BUILDING, own))
    expect([(await bag(driver)).length, twin.texts.size, twin.hasBallast()]).toEqual([1, 1, false])

    const alwaysFull: Driver = { ...driver, transaction: () => Promise.reject(new Error('database or disk is full')) }
    const failing = saveSafely(alwaysFull, twin, stamp)
    await expect(failing((inside, own) => appendMutation(inside, entry, BUILDING, own))).rejects.toThrow('full')
    expect([(await bag(driver)).length, twin.texts.size]).toEqual([1, 1])
  })
})
