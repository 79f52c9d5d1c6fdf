import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import type { BagFile } from '@/shared/schemas/bagFile'
import { sealBag } from '@/shared/sync/sealBag'
import { buildPerson } from '@/tests/support/buildPerson'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { deviceKey } from '@/tests/support/deviceKey'
import { signInAs, type SignedInPerson } from '@/tests/support/signInAs'
import { assertNothingLost } from './testPhone'
import { testTown, type TestTown } from './testTown'

let testApp: TestApp
let town: TestTown
let steward: SignedInPerson
let key: ReturnType<typeof deviceKey>
beforeAll(async () => {
  testApp = await createTestApp()
})
afterAll(() => testApp.close())
beforeEach(async () => {
  town = await testTown(testApp, { outlineCount: 40 })
  const { organisationId } = town
  steward = await signInAs(testApp, await buildPerson(testApp, { organisationId, roles: ['steward'], name: 'Stef' }))
  key = deviceKey()
})

const storeys = (aboveGround: number) => ({ storeys: { aboveGround, knownBy: 'seen' as const } })
const post = (path: string, person: SignedInPerson | null, body: object = {}) =>
  testApp.http
    .post(`/api/v1${path}`)
    .set(person?.bearer ?? {})
    .send(body)
const waiting = async () =>
  (await testApp.http.get('/api/v1/quarantine').set(steward.bearer)).body as {
    count: number
    entries: { mutationId: string; source: string; reason: { code: string }; buildingReference: string | null }[]
  }
const enrol = () =>
  post('/sync/device-key', town.surveyor, { deviceId: town.surveyor.deviceId, publicKey: key.publicKey })
const shutOut = () =>
  testApp.owner.run('UPDATE device SET revoked_at = now() WHERE device_id = $deviceId', {
    deviceId: town.surveyor.deviceId,
  })
const letIn = () =>
  testApp.owner.run('UPDATE device SET revoked_at = NULL WHERE device_id = $deviceId', {
    deviceId: town.surveyor.deviceId,
  })

function fileOf(more: Partial<BagFile['bag']> = {}, sign = key.sign): Promise<BagFile> {
  const { organisationId, personId, deviceId } = town.surveyor
  const bag = { organisationId, personId, deviceId, mutations: town.phone.bag, drafts: [], photos: [], refused: [] }
  return sealBag({ ...bag, ...more }, new Date('2026-11-30T16:00:00Z'), sign)
}
const sheetOf = async (id = town.round.buildingIds[0]!) =>
  (
    await testApp.owner.rows<{ answers: unknown; recorded_by: string; change_no: string }>(
      'SELECT answers, recorded_by, change_no FROM sheet WHERE sheet_id = $id',
      { id },
    )
  )[0]

describe('F22 the bag of a device that is shut out', () => {
  it('is handed over with 40 entries, shows nothing, and counts once each when a steward releases it', async () => {
    await enrol()
    for (const id of town.round.buildingIds) town.phone.saveSheet(id, storeys(3))
    await shutOut()
    const first = await post('/sync/surrender', null, await fileOf())
    const again = await post('/sync/surrender', null, await fileOf())
    expect([first.status, first.body.takenCount, first.body.knownCount]).toEqual([200, 40, 0])
    expect([again.body.takenCount, again.body.knownCount]).toEqual([0, 40])
    expect(Object.keys(first.body).sort()).toEqual(['knownCount', 'sha256', 'takenCount'])
    expect(await sheetOf()).toBeUndefined()

    const { entries, count } = await waiting()
    expect([count, entries.length, entries[0]?.source]).toEqual([40, 40, 'surrendered'])
    expect(entries.every(({ buildingReference }) => buildingReference !== null)).toBe(true)
    for (const { mutationId } of entries) {
      const answer = await post(`/quarantine/${mutationId}/release`, steward)
      expect([answer.status, answer.body.outcome]).toEqual([200, 'applied'])
    }

    const { mutationId } = entries[0]!
    expect((await post(`/quarantine/${mutationId}/release`, steward)).body.code).toBe('already-settled')
    expect(await sheetOf()).toMatchObject({ answers: storeys(3), recorded_by: town.surveyor.personId })
    const before = await sheetOf()
    await letIn()
    await town.phone.handIn()
    expect((await sheetOf())?.change_no).toBe(before?.change_no)
    expect(town.phone.bag).toEqual([])
    await assertNothingLost(testApp, [town.phone])
  })

  it.each([
    ['without a signature', () => fileOf({}, async () => null), 403, 'surrender-refused'],
    ['signed by another key', () => fileOf({}, deviceKey().sign), 403, 'surrender-refused'],
    ['in the name of somebody else', () => fileOf({ personId: town.planner.personId }), 403, 'surrender-refused'],
    ['of another organisation', () => fileOf({ organisationId: steward.deviceId }), 403, 'surrender-refused'],
    ['that was changed', async () => ({ ...(await fileOf()), sha256: '0'.repeat(64) }), 422, 'input-not-usable'],
  ])('is not taken %s', async (_, makeFile, status, code) => {
    await enrol()
    town.phone.saveSheet(town.round.buildingIds[0]!, storeys(3))
    await shutOut()

    const answer = await post('/sync/surrender', null, await makeFile())

    expect([answer.status, answer.body.code]).toEqual([status, code])
    expect((await waiting()).count).toBe(0)
  })

  it('is told to hand in as usual while it may', async () => {
    await enrol()
    expect((await post('/sync/surrender', null, await fileOf())).body.code).toBe('device-not-shut')
  })

  it('keeps the key that came first', async () => {
    expect((await enrol()).status).toBe(200)
    expect((await enrol()).status).toBe(200)
    key = deviceKey()
    expect((await enrol()).body.code).toBe('key-differs')
  })
})

describe('F13 a copy that was saved to a file', () => {
  it('waits entry by entry, whether its phone hands in before or after', async () => {
    await enrol()
    const [one, two, three] = town.round.buildingIds as [string, string, string]
    town.phone.saveSheet(one, storeys(1))
    await town.phone.push()
    town.phone.saveSheet(two, storeys(2))
    const draft = { buildingId: three, answers: storeys(5), seen: 0, keptAt: '2026-11-30T15:00:00Z' }
    const answer = await post('/quarantine/import', steward, await fileOf({ drafts: [draft] }))
    expect([answer.status, answer.body]).toMatchObject([
      200,
      { takenCount: 2, knownCount: 1, isSigned: true, personName: 'Ann' },
    ])
    await town.phone.handIn()
    expect(await sheetOf(two)).toMatchObject({ answers: storeys(2) })

    const { entries } = await waiting()
    expect(entries.map(({ reason }) => reason.code).sort()).toEqual(['imported', 'imported-begun'])
    const outcomes = []
    for (const { mutationId } of entries) {
      outcomes.push((await post(`/quarantine/${mutationId}/release`, steward)).body.outcome)
    }

    expect(outcomes.sort()).toEqual(['already-applied', 'applied'])
    expect(await sheetOf(three)).toMatchObject({ answers: storeys(5) })
    await assertNothingLost(testApp, [town.phone])
  })

  it('is said to be unsigned when it is, and refused when its device is not known here', async () => {
    const unsigned = await post('/quarantine/import', steward, await fileOf({}, async () => null))
    expect([unsigned.status, unsigned.body.isSigned]).toEqual([200, false])
    const other = await testTown(testApp)
    const foreign = await fileOf({ deviceId: other.surveyor.deviceId, personId: other.surveyor.personId })
    expect((await post('/quarantine/import', steward, foreign)).body.faults[0].code).toBe('device-unknown')
  })
})

describe('F23 an entry that was set apart', () => {
  async function refuse() {
    const bad = town.phone.save({
      op: 'set',
      type: 'sheet',
      entity: town.round.buildingIds[0]!,
      set: { storeys: { aboveGround: -4, knownBy: 'seen' } },
    })
    await town.phone.push()
    return bad.id
  }

  it('stays as long as it cannot be used, is mended by a steward, and comes as replay from its phone', async () => {
    const id = await refuse()
    const before = await post(`/quarantine/${id}/release`, steward)
    expect([before.status, before.body.code]).toEqual([422, 'mutation-not-usable'])
    const mended = await post(`/quarantine/${id}/release`, steward, { set: storeys(4) })

    expect([mended.status, mended.body.outcome]).toEqual([200, 'applied'])
    expect(await sheetOf()).toMatchObject({ answers: storeys(4) })
    expect((await town.phone.push()).results).toMatchObject([{ id, status: 'replay' }])
    await assertNothingLost(testApp, [town.phone])
  })

  it('G4 never goes over what its own phone wrote since without asking', async () => {
    const id = await refuse()
    town.phone.saveSheet(town.round.buildingIds[0]!, storeys(6))
    await town.phone.handIn()
    await post(`/quarantine/${id}/release`, steward, { set: storeys(4) })
    await town.phone.pull()

    expect(town.phone.of('conflict')).toMatchObject([
      { fields: { group: 'storeys', state: 'open', keptByName: 'Ann', setAsideByName: 'Ann' } },
    ])
  })

  it('is discarded with a reason and stays readable', async () => {
    const id = await refuse()
    expect((await post(`/quarantine/${id}/discard`, steward)).status).toBe(422)
    expect((await post(`/quarantine/${id}/discard`, steward, { why: 'typed twice' })).body.state).toBe('discarded')

    const answer = await testApp.http.get('/api/v1/quarantine?state=discarded').set(steward.bearer)
    expect(answer.body.entries).toMatchObject([{ mutationId: id, settledByName: 'Stef', state: 'discarded' }])
    await assertNothingLost(testApp, [town.phone])
  })
})
