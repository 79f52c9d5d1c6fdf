import { describe, expect, it } from 'vitest'
import { buildBeat } from '@/tests/support/buildFieldEntities'
import { BEAT_ID, BUILDING_ID, ForgetfulServer, type Mishap } from '@/tests/support/forgetfulServer'
import { memoryPhone, type MemoryPhone } from '@/tests/support/memoryPhone'
import { createHandIn, type RunningHandIn } from './createHandIn'

interface Setting {
  readonly phone: MemoryPhone
  readonly server: ForgetfulServer
  readonly handIn: RunningHandIn
  /** Timers that are set. */
  readonly timers: Set<() => void>
  readonly deviceId: () => string
}

async function setting(): Promise<Setting> {
  const phone = await memoryPhone()
  const server = new ForgetfulServer()
  const timers = new Set<() => void>()
  let deviceId = '01980000-0000-7000-8000-0000000000d1'
  const handIn = createHandIn({
    store: phone.sync,
    api: server.api,
    deviceId: () => deviceId,
    renewDeviceId: () => (deviceId = phone.nextId()),
    adoptToken: () => {},
    deviceName: 'test phone',
    publicKey: phone.publicKey,
    sendSurrender: async () => {
      throw new Error('nobody is shut out here')
    },
    now: () => new Date('2026-10-13T14:08:00Z'),
    random: () => 0.5,
    later: (work) => {
      timers.add(work)
      return () => timers.delete(work)
    },
  })
  await handIn.handIn()
  return { phone, server, handIn, timers, deviceId: () => deviceId }
}

async function record(phone: MemoryPhone, aboveGround: number): Promise<void> {
  await phone.field.keepDraft(BUILDING_ID, { storeys: { aboveGround, knownBy: 'seen' } })
  await phone.field.putInBag(BUILDING_ID)
}

async function stateOf({ phone }: Setting) {
  return (await phone.field.readBuilding(BUILDING_ID))?.state
}

describe('createHandIn', () => {
  it('brings beats and buildings to a new phone', async () => {
    const { phone } = await setting()

    expect((await phone.field.listBeats()).map(({ beat }) => beat.name)).toEqual(['Beat 4'])
    expect((await phone.field.readBuilding(BUILDING_ID))?.state).toBe('to-do')
  })

  it('L4 empties the bag only after pull has shown the sheet', async () => {
    const here = await setting()
    await record(here.phone, 3)
    expect(await stateOf(here)).toBe('in-the-bag')

    await here.handIn.handIn()

    expect((await here.phone.field.readBag()).entries).toEqual([])
    expect(await stateOf(here)).toBe('handed-in')
    expect((await here.phone.field.readSheet(BUILDING_ID))?.confirmed?.answers.storeys?.aboveGround).toBe(3)
  })

  it.each<Mishap>(['no-answer', 'answer-lost', 'server-fault'])(
    'P2 applies a sheet once and keeps it until then when there is %s',
    async (mishap) => {
      const here = await setting()
      await record(here.phone, 3)
      here.server.mishaps.push(mishap)

      await here.handIn.handIn()
      expect((await here.phone.field.readBag()).entries).toHaveLength(1)
      expect(here.timers.size).toBe(1)
      await here.handIn.handIn()

      expect(here.server.order).toHaveLength(1)
      expect((await here.phone.field.readBag()).entries).toEqual([])
    },
  )

  it('says that a person must sign in again and keeps the bag', async () => {
    const here = await setting()
    await record(here.phone, 3)
    here.server.mishaps.push('sign-in')

    await here.handIn.handIn()

    expect(here.handIn.getState().stoppedBecause).toBe('sign-in-again')
    expect((await here.phone.field.readBag()).sheetCount).toBe(1)
    expect(here.timers.size).toBe(1)
  })

  it('P1 halves a batch that is too large', async () => {
    const here = await setting()
    for (const storeys of [1, 2, 3, 4]) await record(here.phone, storeys)
    here.server.mishaps.push('too-large')

    await here.handIn.handIn()

    expect(here.server.batchSizes).toEqual([2, 2])
    expect((await here.phone.field.readBag()).entries).toEqual([])
  })

  it('P6 sets a refused sheet apart with its content and lets the others go', async () => {
    const here = await setting()
    await record(here.phone, 1)
    await record(here.phone, 2)
    const [first] = (await here.phone.field.readBag()).entries
    here.server.refused.add(first?.mutationId ?? '')

    await here.handIn.handIn()

    const bag = await here.phone.field.readBag()
    expect(bag.entries).toEqual([])
    expect(bag.quarantined.map(({ problem }) => problem.code)).toEqual(['not-in-your-beats'])
    expect(bag.quarantined[0]?.label).toBe('Sailmaker Yard 3')
    expect(here.server.order).toHaveLength(1)
  })

  it('P6 does not bring a refused answer back over one that was given later', async () => {
    const here = await setting()
    await record(here.phone, 1)
    await record(here.phone, 2)
    const [first] = (await here.phone.field.readBag()).entries
    here.server.refused.add(first?.mutationId ?? '')

    await here.handIn.handIn()

    expect((await here.phone.field.readBuilding(BUILDING_ID))?.answers.storeys?.aboveGround).toBe(2)
    expect((await here.phone.field.readSheet(BUILDING_ID))?.draft).toEqual({})
  })

  it('P6 opens what was refused in the form again, and forgets the refusal when it is put in the bag anew', async () => {
    const here = await setting()
    await record(here.phone, 7)
    const [first] = (await here.phone.field.readBag()).entries
    here.server.refused.add(first?.mutationId ?? '')
    await here.handIn.handIn()
    expect((await here.phone.field.readSheet(BUILDING_ID))?.draft.storeys?.aboveGround).toBe(7)

    await here.phone.field.putInBag(BUILDING_ID)
    await here.handIn.handIn()

    expect((await here.phone.field.readBag()).quarantined).toEqual([])
    expect(await stateOf(here)).toBe('handed-in')
  })

  it('P4 enrols anew with the same ids when its numbers stand for other work', async () => {
    const here = await setting()
    await record(here.phone, 1)
    await here.handIn.handIn()
    await here.phone.driver.run("UPDATE meta SET value = '1' WHERE name = 'nextSeq'")
    await record(here.phone, 2)
    const [second] = (await here.phone.field.readBag()).entries

    await here.handIn.handIn()

    expect(here.server.order.at(-1)).toBe(second?.mutationId)
    expect((await here.phone.field.readBag()).entries).toEqual([])
  })

  it('L6 fetches everything anew when the digest differs, and leaves the bag alone', async () => {
    const here = await setting()
    await here.phone.field.keepDraft(BUILDING_ID, { notes: { text: 'rear wing' } })
    here.server.wrongDigests = 1

    await here.handIn.handIn()

    expect(here.handIn.getState().stoppedBecause).toBeNull()
    expect((await here.phone.field.readSheet(BUILDING_ID))?.draft.notes?.text).toBe('rear wing')
  })

  it('L7 keeps the rows that are there until everything was fetched anew', async () => {
    const here = await setting()
    here.server.mishaps.push('resync', 'no-answer')

    await here.handIn.handIn()
    expect(await here.phone.field.listBeats()).toHaveLength(1)
    await here.handIn.handIn()

    expect(here.handIn.getState().stoppedBecause).toBeNull()
    expect((await here.phone.sync.baseDigest()).count).toBe(2)
  })

  it.each<Mishap>(['no-answer', 'answer-lost'])(
    'P4 ends a change of its device id that broke off when there was %s',
    async (mishap) => {
      const here = await setting()
      await record(here.phone, 3)
      here.server.mishaps.push('fork', mishap)

      await here.handIn.handIn()
      expect(here.handIn.getState().stoppedBecause).toBe('no-network')
      await here.handIn.handIn()

      expect(here.handIn.getState().stoppedBecause).toBeNull()
      expect(here.server.enrolled.at(-1)).toBe(here.deviceId())
      expect(new Set(here.server.enrolled).size).toBe(1)
      expect(here.server.order).toHaveLength(1)
    },
  )

  it('P12 pulls although the app is too old to hand in', async () => {
    const here = await setting()
    await record(here.phone, 3)
    here.server.put({ type: 'beat', id: BEAT_ID, change: 0, fields: { ...buildBeat(), name: 'Beat 5' } })
    here.server.mishaps.push('too-old')

    await here.handIn.handIn()

    expect(here.handIn.getState().stoppedBecause).toBe('upgrade-required')
    expect((await here.phone.field.listBeats())[0]?.beat.name).toBe('Beat 5')
    expect((await here.phone.field.readBag()).sheetCount).toBe(1)
  })

  it('sends nothing more once it is stopped', async () => {
    const here = await setting()
    await record(here.phone, 3)
    here.handIn.stop()

    await here.handIn.handIn()

    expect(here.server.order).toEqual([])
    expect(here.timers.size).toBe(0)
  })

  it('L7 fetches everything anew when its cursor is too old', async () => {
    const here = await setting()
    here.server.mishaps.push('resync')

    await here.handIn.handIn()

    expect(await here.phone.field.readBuilding(BUILDING_ID)).not.toBeNull()
  })

  it('L5 drops the rows of a beat that is no longer its own and keeps the bag', async () => {
    const here = await setting()
    await record(here.phone, 3)
    here.server.beatIds = []
    here.server.mishaps.push('server-fault')
    await here.handIn.handIn()

    await here.phone.sync.applyPage({ changes: [], cursor: '9', beatIds: [], isLast: true })

    expect(await here.phone.field.listBeats()).toEqual([])
    expect((await here.phone.field.readBag()).sheetCount).toBe(1)
  })

  it('has a timer after every try, so that a full bag is never forgotten', async () => {
    const here = await setting()
    await record(here.phone, 3)
    for (const mishap of ['no-answer', 'server-fault', 'sign-in', 'no-answer'] as const) {
      here.server.mishaps.push(mishap)
      await here.handIn.handIn()
      expect(here.timers.size).toBe(1)
    }
    here.handIn.stop()
    expect(here.timers.size).toBe(0)
  })
})
