import { describe, expect, it } from 'vitest'
import type { BagFile } from '@/shared/schemas/bagFile'
import { BUILDING_ID, ForgetfulServer } from '@/tests/support/forgetfulServer'
import { memoryPhone } from '@/tests/support/memoryPhone'
import { createHandIn } from './createHandIn'

const DEVICE_ID = '01980000-0000-7000-8000-0000000000d1'

async function setting({ hasKey = true, receipt = (file: BagFile) => file.sha256 } = {}) {
  const phone = await memoryPhone()
  const server = new ForgetfulServer()
  const files: BagFile[] = []
  const delays: number[] = []
  const handIn = createHandIn({
    store: phone.sync,
    api: server.api,
    deviceId: () => DEVICE_ID,
    renewDeviceId: () => DEVICE_ID,
    adoptToken: () => {},
    deviceName: 'test phone',
    publicKey: hasKey ? phone.publicKey : null,
    sendSurrender: async (file) => {
      files.push(file)
      return { takenCount: file.bag.mutations.length, knownCount: 0, sha256: receipt(file) }
    },
    now: () => new Date('2026-10-13T14:08:00Z'),
    random: () => 0.5,
    later: (_, delayMs) => {
      delays.push(delayMs)
      return () => {}
    },
  })
  await handIn.handIn()
  for (const aboveGround of [2, 3]) {
    await phone.field.keepDraft(BUILDING_ID, { storeys: { aboveGround, knownBy: 'seen' } })
    await phone.field.putInBag(BUILDING_ID)
  }
  await phone.field.keepDraft(BUILDING_ID, { notes: { text: 'begun' } })
  return { phone, server, handIn, files, delays }
}

describe('a device that is shut out', () => {
  it('F22 hands its bag over, keeps all of it set apart, and forgets what it had pulled', async () => {
    const { phone, server, handIn, files } = await setting()
    server.mishaps.push('shut-out')

    await handIn.handIn()

    expect(handIn.getState()).toMatchObject({ stoppedBecause: 'surrendered', phase: 'resting' })
    expect(files.map(({ bag }) => [bag.mutations.length, bag.drafts.length])).toEqual([[2, 1]])
    const bag = await phone.field.readBag()
    expect([bag.entries.length, bag.quarantined.length, bag.startedCount]).toEqual([0, 2, 1])
    expect(await phone.field.listBeats()).toEqual([])
    expect(phone.twin.texts.size).toBe(2)

    server.mishaps.push('shut-out')
    await handIn.handIn()
    expect([files.length, handIn.getState().stoppedBecause]).toEqual([1, 'surrendered'])
  })

  it.each([
    ['the receipt is for another bag', { receipt: () => '0'.repeat(64) }],
    [
      'no receipt comes',
      {
        receipt: () => {
          throw new Error('cut off')
        },
      },
    ],
  ])('F22 keeps its bag when %s', async (_, options) => {
    const { phone, server, handIn } = await setting(options)
    server.mishaps.push('shut-out')

    await handIn.handIn()

    expect(handIn.getState().stoppedBecause).toBe('device-revoked')
    expect((await phone.field.readBag()).entries).toHaveLength(2)
    expect(await phone.field.listBeats()).toHaveLength(1)
  })

  it('F22 goes on where it was when it is let in again', async () => {
    const { phone, server, handIn } = await setting()
    server.mishaps.push('shut-out')
    await handIn.handIn()

    await handIn.handIn()
    expect(await phone.field.listBeats()).toHaveLength(1)
    await phone.field.putInBag(BUILDING_ID)
    await handIn.handIn()

    expect((await phone.field.readBag()).entries).toEqual([])
    expect(server.order).toHaveLength(1)
  })
})

describe('what the server asks of a phone', () => {
  it('P11 is waited for as long as it says, and a little longer', async () => {
    const { server, handIn, delays } = await setting()
    server.mishaps.push('busy')

    await handIn.handIn()

    expect(delays.at(-1)).toBe(42_000)
  })

  it('is told its public key once', async () => {
    const { server, handIn } = await setting()
    await handIn.handIn()

    expect(server.keysTaken).toBe(1)
  })
})
