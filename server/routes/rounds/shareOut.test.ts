import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { roundWithBeats, type RoundWithBeats } from '@/shared/api/rounds'
import { buildDistrict, type TestDistrict } from '@/tests/support/buildDistrict'
import { buildOrganisation } from '@/tests/support/buildOrganisation'
import { buildPerson, type TestPerson } from '@/tests/support/buildPerson'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { signInAs, type SignedInPerson } from '@/tests/support/signInAs'

let testApp: TestApp
let planner: SignedInPerson
let surveyor: TestPerson
let district: TestDistrict
let round: RoundWithBeats
beforeAll(async () => {
  testApp = await createTestApp()
  const { organisationId } = await buildOrganisation(testApp)
  planner = await signInAs(testApp, await buildPerson(testApp, { organisationId, roles: ['planner'] }))
  surveyor = await buildPerson(testApp, { organisationId, name: 'Ann' })
  district = await buildDistrict(testApp, { organisationId, name: 'Mill Bank', outlineCount: 9 })
  const body = { name: 'Spring', districtId: district.districtId, startsOn: '2026-04-01', endsOn: '2026-09-30' }
  round = roundWithBeats.parse((await post('/rounds', body)).body)
})
afterAll(() => testApp.close())

const post = (path: string, body: object) => testApp.http.post(`/api/v1${path}`).set(planner.bearer).send(body)
const beatOf = (name: string, from: number, to: number, surveyorId: string | null = null) => ({
  name,
  surveyorId,
  outlineIds: district.outlineIds.slice(from, to),
})
const shareOut = (beats: object[]) => post(`/rounds/${round.roundId}/share-out`, { beats })
const beatCount = async () =>
  (await testApp.owner.rows('SELECT 1 FROM beat WHERE round_id = $roundId', { roundId: round.roundId })).length

describe('sharing out several beats at once', () => {
  it('makes none when one of them is not usable', async () => {
    const answer = await shareOut([beatOf('North', 0, 4), beatOf('South', 4, 9, randomUUID())])

    expect(answer.status).toBe(422)
    expect(await beatCount()).toBe(0)
  })

  it('makes all of them, each with its buildings and its surveyor', async () => {
    const answer = await shareOut([beatOf('North', 0, 4, surveyor.personId), beatOf('South', 4, 9)])

    expect(answer.status).toBe(201)
    const { beats } = roundWithBeats.parse(answer.body)
    expect(beats.map(({ name, surveyorName, coverage }) => [name, surveyorName, coverage.buildingCount])).toEqual([
      ['North', 'Ann', 4],
      ['South', null, 5],
    ])
  })
})
