import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { buildPerson } from '@/tests/support/buildPerson'
import { buildBeat } from '@/tests/support/buildRound'
import { signInAs, type SignedInPerson } from '@/tests/support/signInAs'
import { assertNothingLost, testPhone, type TestPhone } from './testPhone'
import { testTown, type TestTown } from './testTown'

let testApp: TestApp
let town: TestTown
let ben: SignedInPerson
let bensPhone: TestPhone
beforeAll(async () => {
  testApp = await createTestApp()
})
afterAll(() => testApp.close())
beforeEach(async () => {
  town = await testTown(testApp, { outlineCount: 6 })
  ben = await signInAs(testApp, await buildPerson(testApp, { organisationId: town.organisationId, name: 'Ben' }))
  bensPhone = testPhone(testApp, ben)
})

const storeys = (aboveGround: number) => ({ storeys: { aboveGround, knownBy: 'seen' as const } })
const outlinesOf = (indexes: readonly number[]) => indexes.map((index) => town.round.outlineIds[index])

/** As the planner does it: a beat of some outlines for a surveyor. */
async function shareOut(surveyorId: string | null, outlines: readonly number[], beatId?: string) {
  const path = `/api/v1/rounds/${town.round.roundId}/beats${beatId === undefined ? '' : `/${beatId}`}`
  const body = { name: `Beat ${randomUUID().slice(0, 8)}`, surveyorId, outlineIds: outlinesOf(outlines) }
  const call = beatId === undefined ? testApp.http.post(path) : testApp.http.put(path)
  const answer = await call.set(town.planner.bearer).send(body)
  if (answer.status >= 300) throw new Error(`${answer.status} ${JSON.stringify(answer.body)}`)
  return answer.body as { beats: { beatId: string; surveyorId: string | null; name: string }[] }
}

describe('F21 assignments change while phones are off', () => {
  it('L5 fills a new beat in, in pages, while other changes go on', async () => {
    await bensPhone.pull()
    town.phone.saveSheet(town.round.buildingIds[4] ?? '', storeys(4))
    await town.phone.handIn()
    await testApp.owner.run(
      `UPDATE beat SET surveyor_id = $ben WHERE organisation_id = $organisationId AND beat_id = $beatId`,
      { ben: ben.personId, organisationId: town.organisationId, beatId: town.beat.beatId },
    )

    const first = await bensPhone.pullPage(3)
    bensPhone.saveSheet(town.round.buildingIds[5] ?? '', storeys(5))
    await bensPhone.push()
    await bensPhone.pull(3)

    expect(first).toMatchObject({ more: true })
    expect(bensPhone.of('building').length).toBe(6)
    expect(
      bensPhone
        .of('sheet')
        .map(({ fields }) => fields.answers.storeys?.aboveGround)
        .sort(),
    ).toEqual([4, 5])
    await town.phone.pull()
    expect(town.phone.base.size).toBe(0)
  })

  it('L5 begins to fill in again when yet another beat comes while one is filled in', async () => {
    await bensPhone.pull()
    const give = (beatId: string) =>
      testApp.owner.run(
        'UPDATE beat SET surveyor_id = $ben WHERE organisation_id = $organisationId AND beat_id = $beatId',
        {
          ben: ben.personId,
          organisationId: town.organisationId,
          beatId,
        },
      )
    const early = await buildBeat(testApp, town.round, {
      surveyorId: null,
      buildingIds: town.round.buildingIds.slice(0, 2),
    })
    const late = await buildBeat(testApp, town.round, {
      surveyorId: null,
      buildingIds: town.round.buildingIds.slice(2),
    })
    await bensPhone.pull()
    await give(late.beatId)
    await bensPhone.pullPage(2)
    await give(early.beatId)

    await bensPhone.pull(2)

    expect(bensPhone.of('building').length).toBe(6)
  })

  it('L5 L8 tells a phone of what moved from beat to beat to beat between two pulls', async () => {
    const mine = await shareOut(town.surveyor.personId, [0, 1, 2, 3, 4, 5], town.beat.beatId)
    expect(mine.beats.length).toBe(1)
    town.phone.saveSheet(town.round.buildingIds[0] ?? '', storeys(1))
    await town.phone.handIn()
    const { beats } = await shareOut(null, [0])
    const middle = beats.find(({ beatId }) => beatId !== town.beat.beatId)?.beatId ?? ''
    await shareOut(ben.personId, [0])
    expect(middle).not.toBe('')

    await town.phone.pull()
    await bensPhone.pull()

    expect(town.phone.of('building').length).toBe(5)
    expect(town.phone.of('sheet')).toEqual([])
    expect(bensPhone.of('sheet')).toMatchObject([{ id: town.round.buildingIds[0], fields: { answers: storeys(1) } }])
  })

  it('L8 keeps what moved between two beats of one surveyor, and what came back', async () => {
    await shareOut(town.surveyor.personId, [0, 1, 2, 3, 4, 5], town.beat.beatId)
    await town.phone.pull()
    await shareOut(town.surveyor.personId, [0, 1])
    await town.phone.pull(2)
    expect(town.phone.of('building').length).toBe(6)

    await shareOut(town.surveyor.personId, [0, 1, 2, 3, 4, 5], town.beat.beatId)
    await town.phone.pull(2)

    expect(town.phone.of('building').length).toBe(6)
  })

  it('P8 takes late work of who had the beat, and gives it to who has it now', async () => {
    const [moved = '', whole = ''] = town.round.buildingIds
    await shareOut(town.surveyor.personId, [0, 1, 2, 3, 4, 5], town.beat.beatId)
    await town.phone.pull()
    town.phone.saveSheet(moved, storeys(2))
    town.phone.saveSheet(whole, storeys(3))
    await shareOut(ben.personId, [0])
    await shareOut(ben.personId, [1, 2, 3, 4, 5], town.beat.beatId)

    await town.phone.handIn()
    await bensPhone.pull()

    expect(town.phone.apart).toEqual([])
    expect(town.phone.bag).toEqual([])
    expect(bensPhone.of('sheet').map(({ fields }) => fields.recordedByName)).toEqual(['Ann', 'Ann'])
    await assertNothingLost(testApp, [town.phone])
  })

  it('P8 sets late work apart after thirty days of the server, and work of who never had the beat at once', async () => {
    const [sheetId = ''] = town.round.buildingIds
    await town.phone.pull()
    await shareOut(ben.personId, [0, 1, 2, 3, 4, 5], town.beat.beatId)
    const cem = testPhone(
      testApp,
      await signInAs(testApp, await buildPerson(testApp, { organisationId: town.organisationId })),
    )
    cem.saveSheet(sheetId, storeys(9))
    await cem.push()
    await testApp.owner.run(
      `UPDATE beat_assignment SET until_at = until_at - interval '31 days' WHERE organisation_id = $organisationId AND until_at IS NOT NULL`,
      { organisationId: town.organisationId },
    )
    town.phone.saveSheet(sheetId, storeys(2))
    await town.phone.push()

    for (const phone of [cem, town.phone]) {
      expect(phone.apart).toMatchObject([{ status: 'rejected', problem: { status: 403, code: 'not-in-your-beats' } }])
      await assertNothingLost(testApp, [phone])
    }
  })
})

describe('F22 a device or a person is shut out with work in the bag', () => {
  it.each([
    ['device-revoked', 'UPDATE device SET revoked_at = now() WHERE device_id = $deviceId'],
    ['account-disabled', `UPDATE person SET status = 'disabled' WHERE person_id = $personId`],
  ])('P11 answers %s, takes nothing, shows nothing', async (code, sql) => {
    for (const id of town.round.buildingIds) town.phone.saveSheet(id, storeys(2))
    const { deviceId, personId } = town.surveyor
    await testApp.owner.run(sql, sql.includes('deviceId') ? { deviceId } : { personId })

    await expect(town.phone.push()).rejects.toMatchObject({ status: 403, code })
    await expect(town.phone.pull()).rejects.toMatchObject({ status: 403, code })
    expect(town.phone.bag.length).toBe(6)
    await assertNothingLost(testApp, [town.phone])
  })
})
