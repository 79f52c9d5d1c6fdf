import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { reviewQueue, reviewSheet } from '@/shared/api/review'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { testTown, type TestTown } from '@/tests/sync/testTown'

let testApp: TestApp
let town: TestTown
let sheetIds: readonly string[]
beforeAll(async () => {
  testApp = await createTestApp()
})
afterAll(() => testApp.close())
beforeEach(async () => {
  town = await testTown(testApp)
  sheetIds = town.round.buildingIds
})

const standing = { finding: { kind: 'standing' as const } }
const storeys = (aboveGround: number) => ({ storeys: { aboveGround, knownBy: 'seen' as const } })
const queue = async (query: object = {}, person = town.planner) => {
  const answer = await testApp.http.get('/api/v1/review/queue').query(query).set(person.bearer)
  expect(answer.status).toBe(200)
  return reviewQueue.response.parse(answer.body)
}
const read = (sheetId: string, person = town.planner) =>
  testApp.http.get(`/api/v1/sheets/${sheetId}`).set(person.bearer)
const sheetOf = async (sheetId: string) => reviewSheet.parse((await read(sheetId)).body)
const check = (sheets: object[], person = town.planner) =>
  testApp.http.post('/api/v1/review/check').set(person.bearer).send({ sheets })
const sendBack = (sheetId: string, body: object, person = town.planner) =>
  testApp.http.post(`/api/v1/sheets/${sheetId}/send-back`).set(person.bearer).send(body)
const settle = (conflictId: string, choice: string, person = town.planner) =>
  testApp.http.post(`/api/v1/conflicts/${conflictId}/settle`).set(person.bearer).send({ choice })
const audit = async () =>
  (
    await testApp.owner.rows<{ action: string }>(
      'SELECT action FROM audit_entry WHERE organisation_id = $organisationId ORDER BY audit_id',
      { organisationId: town.organisationId },
    )
  ).map(({ action }) => action)

describe('the review queue', () => {
  it('shows those with most flags first, with counts of all states', async () => {
    const [plain = '', flagged = '', gone = ''] = sheetIds
    town.phone.saveSheet(plain, { finding: { kind: 'inaccessible' } })
    town.phone.saveSheet(flagged, {
      ...standing,
      ...storeys(9),
      use: { use: 'terraced', knownBy: 'seen' },
      position: { longitude: 16.31, latitude: 48.1, accuracyM: 70 },
    })
    town.phone.saveSheet(gone, standing)
    town.phone.save({ op: 'delete', type: 'sheet', entity: gone })
    await town.phone.handIn()

    const { sheets, counts } = await queue()

    expect(sheets).toMatchObject([
      {
        sheetId: flagged,
        reference: 'R-0002',
        label: 'Ferry Lane 2',
        recordedByName: 'Ann',
        photoCount: 0,
        flags: [
          'photo-missing',
          'far-from-outline',
          'position-doubtful',
          'storeys-out-of-range',
          'storeys-contradict-height',
          'much-not-known',
        ],
      },
      { sheetId: plain, flags: [] },
    ])
    expect(counts).toEqual({ handedIn: 2, checked: 0, sentBack: 0 })
  })

  it('chooses by round and state, and cuts where it is told', async () => {
    for (const id of sheetIds) town.phone.saveSheet(id, standing)
    await town.phone.handIn()
    const { change } = await sheetOf(sheetIds[0] ?? '')
    await check([{ sheetId: sheetIds[0], change }])

    expect((await queue({ roundId: town.round.roundId, state: 'checked' })).sheets.length).toBe(1)
    expect((await queue({ limit: 2 })).sheets.map(({ reference }) => reference)).toEqual(['R-0001', 'R-0002'])
    expect((await queue({ roundId: randomUUID() })).sheets).toEqual([])
    expect((await testApp.http.get('/api/v1/review/queue?limit=0').set(town.planner.bearer)).status).toBe(422)
  })

  it('is of the own organisation only, and for planners only', async () => {
    town.phone.saveSheet(sheetIds[0] ?? '', standing)
    await town.phone.handIn()
    const stranger = (await testTown(testApp)).planner

    expect((await queue({}, stranger)).sheets).toEqual([])
    for (const answer of [
      await read(sheetIds[0] ?? '', stranger),
      await sendBack(sheetIds[0] ?? '', { question: 'Why?', change: 1 }, stranger),
      await settle(randomUUID(), 'kept', stranger),
    ]) {
      expect(answer.status).toBe(404)
    }
    expect((await check([{ sheetId: sheetIds[0], change: 1 }], stranger)).body).toEqual({
      checkedIds: [],
      changedMeanwhileIds: [sheetIds[0]],
    })
    expect((await read(sheetIds[0] ?? '', town.surveyor)).status).toBe(403)
  })
})

describe('the planner speaks', () => {
  it('checks many as they were seen, and leaves and names what changed meanwhile', async () => {
    for (const id of sheetIds) town.phone.saveSheet(id, standing)
    await town.phone.handIn()
    const seen = await Promise.all(sheetIds.map(sheetOf))
    town.phone.saveSheet(sheetIds[1] ?? '', storeys(3))
    await town.phone.handIn()

    const answer = await check(seen.map(({ sheetId, change }) => ({ sheetId, change })))
    await town.phone.pull()

    expect(answer.body.checkedIds.sort()).toEqual([sheetIds[0], sheetIds[2], sheetIds[3]].sort())
    expect(answer.body.changedMeanwhileIds).toEqual([sheetIds[1]])
    expect(town.phone.sheet(sheetIds[0] ?? '')?.fields.review).toMatchObject({
      state: 'checked',
      reviewedByName: 'Pia',
    })
    expect(town.phone.sheet(sheetIds[1] ?? '')?.fields.review.state).toBe('handed-in')
    expect(await audit()).toEqual(['sheet-checked', 'sheet-checked', 'sheet-checked'])
    const again = await sheetOf(sheetIds[0] ?? '')
    expect((await check([{ sheetId: again.sheetId, change: again.change }])).body.checkedIds).toEqual([again.sheetId])
    expect((await audit()).length).toBe(3)
  })

  it('G5 sends back with a question, takes the answer as the next revision, and shows the way there', async () => {
    const [sheetId = ''] = sheetIds
    town.phone.saveSheet(sheetId, { ...standing, ...storeys(2) })
    await town.phone.handIn()
    const { change } = await sheetOf(sheetId)

    const answer = await sendBack(sheetId, { question: '  Is the top storey set back? ', change })
    await town.phone.pull()
    const asked = town.phone.sheet(sheetId)
    town.phone.saveSheet(sheetId, storeys(3))
    await town.phone.handIn()
    const now = await sheetOf(sheetId)

    expect(answer.body).toMatchObject({ state: 'sent-back', review: { question: 'Is the top storey set back?' } })
    expect(asked?.fields.review).toMatchObject({ state: 'sent-back', question: 'Is the top storey set back?' })
    expect(now).toMatchObject({ state: 'handed-in', revision: 2, review: { question: null }, answers: storeys(3) })
    expect(
      now.revisions.map(({ revision, state, byName, answers }) => [
        revision,
        state,
        byName,
        answers.storeys?.aboveGround,
      ]),
    ).toEqual([
      [1, 'handed-in', 'Ann', 2],
      [1, 'sent-back', 'Pia', 2],
      [2, 'handed-in', 'Ann', 3],
    ])
    expect(await audit()).toEqual(['sheet-sent-back'])
  })

  it('refuses to send back what changed meanwhile, and a question that is none', async () => {
    const [sheetId = ''] = sheetIds
    town.phone.saveSheet(sheetId, standing)
    await town.phone.handIn()
    const { change } = await sheetOf(sheetId)

    const late = await sendBack(sheetId, { question: 'Why?', change: change - 1 })
    const empty = await sendBack(sheetId, { question: '  ', change })

    expect([late.status, late.body.code]).toEqual([409, 'changed-meanwhile'])
    expect([empty.status, empty.body.faults[0].pointer]).toEqual([422, '/body/question'])
    expect((await sheetOf(sheetId)).state).toBe('handed-in')
  })
})

describe('F17 two devices on one building', () => {
  /** Both phones have the building on screen; Ann's comes first. */
  async function bothWrite(one: object, other: object) {
    const second = await town.secondPhone()
    const [sheetId = ''] = sheetIds
    await town.phone.pull()
    await second.pull()
    town.phone.saveSheet(sheetId, one)
    second.saveSheet(sheetId, other)
    await town.phone.handIn()
    await second.handIn()
    await town.phone.pull()
    return { sheetId, second }
  }

  it('G2 G4 merges other groups, keeps both values of one, and shows them to both phones and the planner', async () => {
    const { sheetId, second } = await bothWrite(
      { ...standing, ...storeys(2) },
      { ...storeys(3), notes: { text: 'rear wing' } },
    )

    const sheet = await sheetOf(sheetId)

    expect(sheet.answers).toEqual({ ...standing, ...storeys(3), notes: { text: 'rear wing' } })
    expect(sheet.conflicts).toMatchObject([
      {
        group: 'storeys',
        kept: storeys(3).storeys,
        setAside: storeys(2).storeys,
        state: 'open',
        keptByName: 'Ann',
        setAsideByName: 'Ann',
      },
    ])
    expect(sheet.flags).toContain('conflict-open')
    for (const phone of [town.phone, second]) {
      expect(phone.of('conflict')).toMatchObject([{ fields: { sheetId, group: 'storeys', state: 'open' } }])
      expect(phone.sheet(sheetId)?.fields.answers).toEqual(sheet.answers)
    }
  })

  it.each([
    ['the planner', 'kept'],
    ['the planner', 'set-aside'],
    ['a surveyor', 'kept'],
    ['a surveyor', 'set-aside'],
  ] as const)('G8 is settled by %s with the value %s, once, for everybody', async (who, choice) => {
    const { sheetId, second } = await bothWrite(storeys(2), storeys(3))
    const conflictId = second.of('conflict')[0]?.id ?? ''

    if (who === 'the planner') {
      expect((await settle(conflictId, choice)).status).toBe(200)
    } else {
      second.save({ op: 'resolve', type: 'conflict', entity: conflictId, set: { choice } })
      await second.handIn()
    }
    const after = await settle(conflictId, choice === 'kept' ? 'set-aside' : 'kept')
    town.phone.save({ op: 'resolve', type: 'conflict', entity: conflictId, set: { choice: 'set-aside' } })
    const { results } = await town.phone.push()
    await town.phone.handIn()
    await second.pull()

    const wanted = choice === 'kept' ? 3 : 2
    expect(after.body.answers.storeys.aboveGround).toBe(wanted)
    expect(results).toMatchObject([{ status: 'applied', problem: { code: 'already-settled' } }])
    for (const phone of [town.phone, second]) {
      expect(phone.sheet(sheetId)?.fields.answers.storeys?.aboveGround).toBe(wanted)
      expect(phone.of('conflict')).toMatchObject([{ fields: { state: 'settled' } }])
    }
    expect((await sheetOf(sheetId)).flags).not.toContain('conflict-open')
  })

  it('G6 makes a proposal of what is written on a sheet that was checked meanwhile', async () => {
    const [sheetId = ''] = sheetIds
    town.phone.saveSheet(sheetId, storeys(2))
    await town.phone.handIn()
    const { change } = await sheetOf(sheetId)
    await check([{ sheetId, change }])
    town.phone.saveSheet(sheetId, storeys(3))
    const { results } = await town.phone.push()
    await town.phone.handIn()

    const sheet = await sheetOf(sheetId)

    expect(results).toMatchObject([{ status: 'applied', conflicts: [expect.any(String)] }])
    expect(sheet).toMatchObject({
      state: 'checked',
      answers: storeys(2),
      conflicts: [{ setAside: storeys(3).storeys }],
    })
    const settled = await settle(sheet.conflicts[0]?.conflictId ?? '', 'set-aside')
    expect(settled.body).toMatchObject({ state: 'checked', answers: storeys(3), conflicts: [{ state: 'settled' }] })
    expect(await audit()).toEqual(['sheet-checked', 'conflict-settled'])
  })

  it('G7 asks when one deletes what the other writes on, and deletes when the planner says so', async () => {
    const second = await town.secondPhone()
    const [sheetId = ''] = sheetIds
    town.phone.saveSheet(sheetId, storeys(2))
    await town.phone.handIn()
    await second.pull()
    town.phone.save({ op: 'delete', type: 'sheet', entity: sheetId })
    second.saveSheet(sheetId, { notes: { text: 'still here' } })
    await second.handIn()
    await town.phone.handIn()
    const sheet = await sheetOf(sheetId)

    const deleted = await settle(sheet.conflicts[0]?.conflictId ?? '', 'set-aside')
    await second.pull()

    expect(sheet.conflicts).toMatchObject([
      { group: 'deletion', kept: { isDeleted: false }, setAside: { isDeleted: true } },
    ])
    expect(deleted.status).toBe(200)
    expect((await read(sheetId)).status).toBe(404)
    expect(second.sheet(sheetId)).toBeUndefined()
  })
})
