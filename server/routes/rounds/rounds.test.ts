import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { roundWithBeats, type RoundWithBeats } from '@/shared/api/rounds'
import { buildDistrict, type TestDistrict } from '@/tests/support/buildDistrict'
import { buildOrganisation } from '@/tests/support/buildOrganisation'
import { buildPerson, type TestPerson } from '@/tests/support/buildPerson'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { signInAs, type SignedInPerson } from '@/tests/support/signInAs'

let testApp: TestApp
let planner: SignedInPerson
let stranger: SignedInPerson
let surveyors: [TestPerson, TestPerson]
let district: TestDistrict
beforeAll(async () => {
  testApp = await createTestApp()
  const { organisationId } = await buildOrganisation(testApp)
  planner = await signInAs(testApp, await buildPerson(testApp, { organisationId, roles: ['planner'] }))
  stranger = await signInAs(testApp, await buildPerson(testApp, { roles: ['planner'] }))
  surveyors = [
    await buildPerson(testApp, { organisationId, name: 'Ann' }),
    await buildPerson(testApp, { organisationId, name: 'Ben' }),
  ]
  district = await buildDistrict(testApp, { organisationId, name: 'Mill Bank', outlineCount: 10 })
})
afterAll(() => testApp.close())

const dates = { startsOn: '2026-04-01', endsOn: '2026-09-30' }
const send = (person: SignedInPerson, method: 'post' | 'put' | 'delete' | 'get', path: string, body?: object) =>
  testApp.http[method](`/api/v1${path}`).set(person.bearer).send(body)
const open = async (name = 'Spring'): Promise<RoundWithBeats> =>
  roundWithBeats.parse(
    (await send(planner, 'post', '/rounds', { name, districtId: district.districtId, ...dates })).body,
  )
const beatBody = (from: number, to: number, surveyorId: string | null = null, name = 'North side') => ({
  name,
  surveyorId,
  outlineIds: district.outlineIds.slice(from, to),
})
const epochOf = async ({ personId }: TestPerson) =>
  Number(
    (
      await testApp.owner.rows<{ e: string }>('SELECT scope_epoch AS e FROM person WHERE person_id = $personId', {
        personId,
      })
    )[0]?.e,
  )
const headOf = async () =>
  Number(
    (
      await testApp.owner.rows<{ head: string }>('SELECT head FROM organisation WHERE organisation_id = $id', {
        id: planner.organisationId,
      })
    )[0]?.head,
  )

/** A handed-in sheet on a building, with a photo and a conflict. */
async function record(round: RoundWithBeats, buildingId: string, state = 'handed-in') {
  const { outlineId, beatId } = round.buildings.find((building) => building.buildingId === buildingId) ?? {}
  const ids = { sheetId: buildingId, photoId: randomUUID(), conflictId: randomUUID() }
  const bind = {
    organisationId: planner.organisationId,
    roundId: round.roundId,
    outlineId,
    beatId,
    state,
    by: surveyors[0].personId,
    ...ids,
  }
  await testApp.owner.run(
    `INSERT INTO sheet (organisation_id, sheet_id, round_id, beat_id, outline_id, state, recorded_by, change_no)
     VALUES ($organisationId, $sheetId, $roundId, $beatId, $outlineId, $state, $by, 1)`,
    bind,
  )
  await testApp.owner.run(
    `INSERT INTO photo (organisation_id, photo_id, sheet_id, beat_id, sha256, bytes, mime, width_px, height_px, tag, state, taken_by, change_no)
     VALUES ($organisationId, $photoId, $sheetId, $beatId, 'x', 1, 'image/jpeg', 1, 1, 'rear', 'stored', $by, 2)`,
    bind,
  )
  await testApp.owner.run(
    `INSERT INTO conflict (organisation_id, conflict_id, sheet_id, beat_id, field_group, state, change_no)
     VALUES ($organisationId, $conflictId, $sheetId, $beatId, 'use', 'open', 3)`,
    bind,
  )
  return ids
}

describe('a round', () => {
  it('opens over every outline of its district, with nothing recorded and no beats', async () => {
    const round = await open('First')

    expect(round).toMatchObject({
      name: 'First',
      districtName: 'Mill Bank',
      ...dates,
      beats: [],
      footprintShareRecorded: 0,
      coverage: { buildingCount: 10, toDoCount: 10, handedInCount: 0, checkedCount: 0, sentBackCount: 0 },
    })
    expect(new Set(round.buildings.map(({ outlineId }) => outlineId))).toEqual(new Set(district.outlineIds))
    expect(round.buildings.every(({ beatId, state }) => beatId === null && state === 'to-do')).toBe(true)
  })

  it('gives each building a change number of its own, up to the head of the organisation', async () => {
    const before = await headOf()
    const round = await open()
    const rows = await testApp.owner.rows<{ change_no: string }>(
      'SELECT change_no FROM round_building WHERE round_id = $roundId ORDER BY change_no',
      { roundId: round.roundId },
    )

    expect(rows.map(({ change_no }) => Number(change_no))).toEqual(
      Array.from({ length: 10 }, (_, index) => before + 1 + index),
    )
    expect(await headOf()).toBe(before + 10)
  })

  it('counts coverage by the state of sheets, and the footprint that is recorded', async () => {
    const round = await open()
    const [first, second, third] = round.buildings.map(({ buildingId }) => buildingId) as [string, string, string]
    await record(round, first, 'handed-in')
    await record(round, second, 'checked')
    await record(round, third, 'sent-back')

    const read = roundWithBeats.parse((await send(planner, 'get', `/rounds/${round.roundId}`)).body)

    expect(read.coverage).toEqual({
      buildingCount: 10,
      toDoCount: 7,
      handedInCount: 1,
      checkedCount: 1,
      sentBackCount: 1,
    })
    expect(read.footprintShareRecorded).toBeCloseTo(0.2, 4)
    expect(read.buildings.find(({ buildingId }) => buildingId === third)?.state).toBe('sent-back')
    const listed = (await send(planner, 'get', '/rounds')).body.rounds.find(
      ({ roundId }: { roundId: string }) => roundId === round.roundId,
    )
    expect(listed).toMatchObject({ coverage: read.coverage, footprintShareRecorded: read.footprintShareRecorded })
  })

  it('names what is wrong with a wish', async () => {
    const bad = await send(planner, 'post', '/rounds', {
      name: ' ',
      districtId: 'x',
      startsOn: '2026-13-01',
      endsOn: '2026-01-01',
    })
    const reversed = await send(planner, 'post', '/rounds', {
      name: 'R',
      districtId: district.districtId,
      startsOn: '2026-05-01',
      endsOn: '2026-04-01',
    })
    const empty = await buildDistrict(testApp, { organisationId: planner.organisationId, outlineCount: 0 })
    const bare = await send(planner, 'post', '/rounds', { name: 'R', districtId: empty.districtId, ...dates })

    expect(bad.body.faults.map(({ pointer }: { pointer: string }) => pointer)).toEqual([
      '/body/name',
      '/body/districtId',
      '/body/startsOn',
      '/body/endsOn',
    ])
    expect(reversed.body.faults[0].pointer).toBe('/body/endsOn')
    expect(bare.body.faults[0].code).toBe('district-empty')
  })

  it('is opened by planners of the organisation, in districts of theirs', async () => {
    const surveyor = await signInAs(testApp, surveyors[0])
    const wish = { name: 'R', districtId: district.districtId, ...dates }
    const round = await open()

    expect((await send(surveyor, 'post', '/rounds', wish)).status).toBe(403)
    expect((await send(surveyor, 'get', '/rounds')).status).toBe(403)
    expect((await send(stranger, 'post', '/rounds', wish)).status).toBe(404)
    expect((await send(stranger, 'get', `/rounds/${round.roundId}`)).status).toBe(404)
    expect((await send(stranger, 'get', '/rounds')).body.rounds).toEqual([])
    expect((await send(planner, 'get', `/rounds/${randomUUID()}`)).status).toBe(404)
  })
})

describe('a beat', () => {
  let round: RoundWithBeats
  let beats: string
  beforeEach(async () => {
    round = await open()
    beats = `/rounds/${round.roundId}/beats`
  })
  const make = async (body: object) => roundWithBeats.parse((await send(planner, 'post', beats, body)).body)
  const beatOf = (read: RoundWithBeats, name: string) => read.beats.find((beat) => beat.name === name)
  const holds = (read: RoundWithBeats, beatId: string | undefined) =>
    read.buildings.filter((building) => building.beatId === beatId).length

  it('takes its outlines, its surveyor, and counts them', async () => {
    const answer = await send(planner, 'post', beats, beatBody(0, 4, surveyors[0].personId))

    expect(answer.status).toBe(201)
    expect(answer.body.beats).toMatchObject([
      {
        name: 'North side',
        surveyorId: surveyors[0].personId,
        surveyorName: 'Ann',
        coverage: { buildingCount: 4, toDoCount: 4 },
      },
    ])
    expect(holds(answer.body, answer.body.beats[0].beatId)).toBe(4)
  })

  it('tells the devices of its surveyors, old and new, that their beats changed, and no others', async () => {
    const [ann, ben] = surveyors
    const before = [await epochOf(ann), await epochOf(ben)] as const
    const beatId = beatOf(await make(beatBody(0, 4, ann.personId)), 'North side')?.beatId
    expect([await epochOf(ann), await epochOf(ben)]).toEqual([before[0] + 1, before[1]])

    await send(planner, 'put', `${beats}/${beatId}`, beatBody(0, 4, ben.personId))
    expect([await epochOf(ann), await epochOf(ben)]).toEqual([before[0] + 2, before[1] + 1])

    await send(planner, 'put', `${beats}/${beatId}`, beatBody(0, 3, ben.personId, 'Renamed'))
    expect([await epochOf(ann), await epochOf(ben)]).toEqual([before[0] + 2, before[1] + 1])

    await send(planner, 'delete', `${beats}/${beatId}`)
    expect([await epochOf(ann), await epochOf(ben)]).toEqual([before[0] + 2, before[1] + 2])
  })

  it('hands a building over with sheet, photos and conflicts, numbered anew, and leaves an exit for each', async () => {
    let read = await make(beatBody(0, 4, surveyors[0].personId, 'A'))
    read = await make(beatBody(4, 8, surveyors[1].personId, 'B'))
    const [a, b] = [beatOf(read, 'A')?.beatId ?? '', beatOf(read, 'B')?.beatId ?? '']
    const moved = read.buildings.find(({ outlineId }) => outlineId === district.outlineIds[3])?.buildingId ?? ''
    const ids = await record(read, moved)
    const before = await headOf()

    const after = roundWithBeats.parse(
      (await send(planner, 'put', `${beats}/${b}`, beatBody(3, 8, surveyors[1].personId, 'B'))).body,
    )

    expect([holds(after, a), holds(after, b)]).toEqual([3, 5])
    const rows = await testApp.owner.rows<{ id: string; beat_id: string; change_no: string }>(
      `SELECT building_id AS id, beat_id, change_no FROM round_building WHERE building_id = $moved
       UNION ALL SELECT sheet_id, beat_id, change_no FROM sheet WHERE sheet_id = $moved
       UNION ALL SELECT photo_id, beat_id, change_no FROM photo WHERE sheet_id = $moved
       UNION ALL SELECT conflict_id, beat_id, change_no FROM conflict WHERE sheet_id = $moved
       UNION ALL SELECT beat_id, beat_id, change_no FROM beat WHERE beat_id IN ($a, $b)`,
      { moved, a, b },
    )
    const exits = await testApp.owner.rows<{
      beat_id: string
      entity_type: string
      entity_id: string
      change_no: string
    }>(
      'SELECT beat_id, entity_type, entity_id, change_no FROM scope_exit WHERE beat_id IN ($a, $b) ORDER BY entity_type',
      { a, b },
    )
    expect(rows.slice(0, 4).every(({ beat_id }) => beat_id === b)).toBe(true)
    expect(exits.map(({ beat_id, entity_type, entity_id }) => [beat_id, entity_type, entity_id])).toEqual([
      [a, 'building', moved],
      [a, 'conflict', ids.conflictId],
      [a, 'photo', ids.photoId],
      [a, 'sheet', moved],
    ])
    const numbers = [...rows, ...exits].map(({ change_no }) => Number(change_no)).sort((one, other) => one - other)
    expect(numbers).toEqual(Array.from({ length: 10 }, (_, index) => before + 1 + index))
    expect(await headOf()).toBe(before + 10)
  })

  it('gives up outlines that are no longer named, and all of them when it is dissolved; sheets stay', async () => {
    const read = await make(beatBody(0, 4, null, 'A'))
    const beatId = beatOf(read, 'A')?.beatId ?? ''
    const kept = read.buildings.find(({ outlineId }) => outlineId === district.outlineIds[0])?.buildingId ?? ''
    await record(read, kept)

    const smaller = roundWithBeats.parse(
      (await send(planner, 'put', `${beats}/${beatId}`, beatBody(0, 1, null, 'A'))).body,
    )
    const dissolved = await send(planner, 'delete', `${beats}/${beatId}`)

    expect(holds(smaller, beatId)).toBe(1)
    expect(dissolved.status).toBe(200)
    expect(dissolved.body).toMatchObject({ beats: [], coverage: { handedInCount: 1 } })
    const [sheet] = await testApp.owner.rows('SELECT beat_id, deleted_at FROM sheet WHERE sheet_id = $kept', { kept })
    expect(sheet).toEqual({ beat_id: null, deleted_at: null })
    expect((await send(planner, 'delete', `${beats}/${beatId}`)).status).toBe(404)
    expect((await send(planner, 'put', `${beats}/${beatId}`, beatBody(0, 1))).status).toBe(404)
  })

  it('names each outline that is not in the frame, and a surveyor who is none', async () => {
    const foreign = await buildDistrict(testApp, { organisationId: planner.organisationId, outlineCount: 1 })
    const outlineIds = [district.outlineIds[0], foreign.outlineIds[0], randomUUID()]
    const disabled = await buildPerson(testApp, { organisationId: planner.organisationId, status: 'disabled' })

    const outside = await send(planner, 'post', beats, { name: 'A', surveyorId: null, outlineIds })

    expect(outside.status).toBe(422)
    expect(outside.body.faults.map(({ pointer, code }: { pointer: string; code: string }) => [pointer, code])).toEqual([
      ['/body/outlineIds/1', 'not-in-frame'],
      ['/body/outlineIds/2', 'not-in-frame'],
    ])
    for (const surveyorId of [planner.personId, stranger.personId, disabled.personId, randomUUID()]) {
      const answer = await send(planner, 'post', beats, { ...beatBody(0, 1), surveyorId })
      expect([answer.status, answer.body.faults[0].code]).toEqual([422, 'not-a-surveyor'])
    }
    expect((await send(planner, 'get', `/rounds/${round.roundId}`)).body.beats).toEqual([])
  })

  it('belongs to its round and its organisation', async () => {
    const beatId = beatOf(await make(beatBody(0, 4)), 'North side')?.beatId
    const other = await open('Other')
    const surveyor = await signInAs(testApp, surveyors[0])

    for (const [person, path, status] of [
      [planner, `/rounds/${other.roundId}/beats/${beatId}`, 404],
      [stranger, `${beats}/${beatId}`, 404],
      [planner, `/rounds/${randomUUID()}/beats/${beatId}`, 404],
      [surveyor, `${beats}/${beatId}`, 403],
    ] as const) {
      expect((await send(person, 'put', path, beatBody(0, 1))).status).toBe(status)
      expect((await send(person, 'delete', path)).status).toBe(status)
    }
    expect((await send(stranger, 'post', beats, beatBody(0, 1))).status).toBe(404)
  })

  it('holds each outline once, when two planners share the same outlines out at the same time', async () => {
    const wishes = Array.from({ length: 6 }, (_, index) =>
      send(planner, 'post', beats, beatBody(index, index + 5, null, `Beat ${index}`)),
    )
    const statuses = (await Promise.all(wishes)).map(({ status }) => status)
    const numbers = await testApp.owner.rows<{ n: number; change_no: string }>(
      `SELECT count(*)::int AS n, change_no FROM (
         SELECT change_no FROM round_building WHERE organisation_id = $id
         UNION ALL SELECT change_no FROM beat WHERE organisation_id = $id
         UNION ALL SELECT change_no FROM scope_exit WHERE organisation_id = $id) AS all_changes
       GROUP BY change_no HAVING count(*) > 1`,
      { id: planner.organisationId },
    )

    expect(statuses).toEqual(Array(6).fill(201))
    expect(numbers).toEqual([])
  })
})
