import { Sequelize, QueryTypes } from 'sequelize'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { takeChangeNumbers } from '@/server/commands/takeChangeNumbers'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { buildPerson } from '@/tests/support/buildPerson'
import { signInAs } from '@/tests/support/signInAs'
import { assertNothingLost, testPhone } from './testPhone'
import { testTown, type TestTown } from './testTown'

let testApp: TestApp
let town: TestTown
beforeAll(async () => {
  testApp = await createTestApp({ poolSize: 8 })
})
afterAll(() => testApp.close())
beforeEach(async () => {
  town = await testTown(testApp)
})

const storeys = (aboveGround: number) => ({ storeys: { aboveGround, knownBy: 'seen' as const } })
const pull = (query: object, person = town.surveyor) =>
  testApp.http
    .get('/api/v1/sync/pull')
    .query({ deviceId: person.deviceId, schema: 1, ...query })
    .set(person.bearer)

describe('the first download', () => {
  it('L2 L6 brings beats and buildings in pages, in the order of changes, with a digest on the last page only', async () => {
    const { phone, beat } = await testTown(testApp, { outlineCount: 25 })

    const pages = []
    do pages.push(await phone.pullPage(10))
    while (pages.at(-1)?.more)

    const changes = pages.flatMap((page) => page.changes.map(({ change }) => change))
    expect(changes).toEqual([...changes].sort((one, other) => one - other))
    expect(pages.map(({ digest }) => digest?.count)).toEqual([undefined, undefined, 26])
    expect(phone.of('beat')).toMatchObject([
      { id: beat.beatId, fields: { buildingCount: 25, roundName: 'Spring round' } },
    ])
    expect(phone.of('building')[0]?.fields).toMatchObject({
      beatId: beat.beatId,
      outline: { reference: expect.stringMatching(/^R-/), register: { year: 1930 } },
      geometry: { type: 'Polygon' },
    })
  })

  it('L1 answers an empty scope with nothing and a digest of nothing', async () => {
    const idle = await signInAs(testApp, await buildPerson(testApp, { organisationId: town.organisationId }))
    const phone = testPhone(testApp, idle)

    const page = await phone.pull()

    expect(page).toMatchObject({ changes: [], more: false, ackSeq: 0, digest: { count: 0 }, scope: { beatIds: [] } })
  })
})

describe('pulling on', () => {
  it('L2 brings only what changed, and a page that comes again does no harm', async () => {
    const { phone, round } = town
    await phone.pull()
    const [sheetId = ''] = round.buildingIds
    phone.saveSheet(sheetId, storeys(2))
    await phone.push()
    const before = phone.cursor

    const page = await phone.pullPage()
    const after = phone.cursor
    phone.cursor = before
    const again = await phone.pullPage()

    expect(page.changes).toMatchObject([{ type: 'sheet', id: sheetId }])
    expect(again.changes).toEqual(page.changes)
    phone.cursor = after
    expect((await phone.pullPage()).changes).toEqual([])
  })

  it('L3 L4 acknowledges from the snapshot of the page', async () => {
    const { phone, round } = town
    const [sheetId = ''] = round.buildingIds
    phone.saveSheet(sheetId, storeys(2))
    expect((await phone.pullPage()).ackSeq).toBe(0)
    await phone.push()

    const page = await phone.pullPage()

    expect(page.ackSeq).toBe(1)
    expect(page.changes).toMatchObject([{ type: 'sheet', change: expect.any(Number) }])
  })

  it('L6 repeats the digest while nothing changes, and counts anew when something did', async () => {
    const { phone, round } = town
    const first = await phone.pull()
    const second = await phone.pull()
    phone.saveSheet(round.buildingIds[0] ?? '', storeys(2))
    await phone.push()
    const third = await phone.pull()

    expect(second.digest).toEqual(first.digest)
    expect(third.digest?.count).toBe((first.digest?.count ?? 0) + 1)
  })

  it('L6 lets a phone find out that it lost a row', async () => {
    const { phone } = town
    await phone.pull()
    const [building] = phone.of('building')
    phone.base.delete(`building/${building?.id}`)

    await expect(phone.pull()).rejects.toThrow(/digest/)
  })

  it('L8 tells of a deleted sheet, and of one that came back', async () => {
    const { phone, round, secondPhone } = town
    const other = await secondPhone()
    const [sheetId = ''] = round.buildingIds
    phone.saveSheet(sheetId, storeys(2))
    await phone.handIn()
    await other.pull()
    phone.save({ op: 'delete', type: 'sheet', entity: sheetId })
    await phone.handIn()
    await other.pull()
    const between = other.sheet(sheetId)
    other.save({ op: 'undelete', type: 'sheet', entity: sheetId })
    await other.handIn()
    await phone.pull()

    expect(between).toBeUndefined()
    expect(phone.sheet(sheetId)?.fields.answers).toEqual(storeys(2))
  })

  it('L7 sends a phone back to the start when deletions it needs are no longer remembered, and only then', async () => {
    const { phone, organisationId, secondPhone } = town
    await phone.pullPage(2)
    const early = phone.cursor
    await phone.pull()
    await testApp.owner.run(
      'UPDATE organisation SET head = head + 10, floor = head + 5 WHERE organisation_id = $organisationId',
      {
        organisationId,
      },
    )

    await expect(phone.pull()).rejects.toMatchObject({ status: 410, code: 'resync-required' })
    phone.cursor = early
    await expect(phone.pull()).rejects.toMatchObject({ status: 410 })
    phone.cursor = undefined
    await phone.pull(2)
    await (await secondPhone()).pull(1)
  })
})

describe('F12 a change that commits late', () => {
  it('waits for the one before it, so that no cursor steps over it', async () => {
    const { phone, round, organisationId, surveyor } = town
    await phone.pull()
    const [first = '', second = ''] = round.buildingIds
    let letGo = () => {}
    const held = new Promise<void>((resolve) => (letGo = resolve))
    const order: string[] = []
    const touch = async (buildingId: string, hold?: Promise<void>) =>
      testApp.context.database.withScope(surveyor, async (scope) => {
        const change = await takeChangeNumbers(scope, 1)
        await scope.execute(
          'UPDATE round_building SET change_no = $change WHERE organisation_id = $organisationId AND building_id = $buildingId',
          { organisationId, buildingId, change },
        )
        order.push(buildingId)
        await hold
      })

    const slow = touch(first, held)
    await expect.poll(() => order).toEqual([first])
    const quick = touch(second)
    const between = await phone.pullPage()
    letGo()
    await Promise.all([slow, quick])
    const after = await phone.pullPage()

    expect(between.changes).toEqual([])
    expect(order).toEqual([first, second])
    expect(after.changes.map(({ id }) => id)).toEqual([first, second])
  })

  it('is lost for ever by a cursor over a plain serial number', async () => {
    const sequelize = new Sequelize(testApp.ownerUrl, { dialect: 'postgres', logging: false, pool: { max: 3 } })
    await sequelize.query('CREATE TABLE plain (change_no bigserial, name text)', { type: QueryTypes.RAW })
    const pullAfter = (cursor: number) =>
      sequelize.query<{ change_no: string; name: string }>('SELECT * FROM plain WHERE change_no > $cursor ORDER BY 1', {
        bind: { cursor },
        type: QueryTypes.SELECT,
      })
    const slow = await sequelize.transaction()
    await sequelize.query(`INSERT INTO plain (name) VALUES ('slow')`, { transaction: slow })
    await sequelize.query(`INSERT INTO plain (name) VALUES ('quick')`)

    const between = await pullAfter(0)
    await slow.commit()
    const after = await pullAfter(Number(between.at(-1)?.change_no))
    await sequelize.close()

    expect(between.map(({ name }) => name)).toEqual(['quick'])
    expect(after).toEqual([])
  })

  it('reaches every phone in a storm of four that hand in while others pull', async () => {
    const storm = await testTown(testApp, { outlineCount: 12 })
    const phones = [storm.phone, ...(await Promise.all([1, 2, 3].map(() => storm.secondPhone())))]
    const reader = await storm.secondPhone()
    let isOver = false
    const reading = (async () => {
      while (!isOver) await reader.pull(3)
    })()
    await Promise.all(
      phones.map(async (phone, index) => {
        for (let turn = 0; turn < 12; turn += 1) {
          phone.saveSheet(storm.round.buildingIds[(turn * 5 + index) % 12] ?? '', storeys(1 + ((turn + index) % 9)))
          await phone.handIn()
        }
      }),
    )
    isOver = true
    await reading
    for (const phone of [...phones, reader]) await phone.pull()

    const truth = reader
      .of('sheet')
      .map(({ id, change, fields }) => ({ id, change, answers: fields.answers }))
      .sort(byId)
    expect(truth.length).toBe(12)
    for (const phone of phones) {
      expect(
        phone
          .of('sheet')
          .map(({ id, change, fields }) => ({ id, change, answers: fields.answers }))
          .sort(byId),
      ).toEqual(truth)
    }
    await assertNothingLost(testApp, phones)
  })
})

const byId = (one: { id: string }, other: { id: string }) => (one.id < other.id ? -1 : 1)

describe('M12 a cursor', () => {
  it('is refused when made up, cut, changed, or of another person or organisation', async () => {
    const good = (await pull({})).body.cursor as string
    const [payload = '', signature = ''] = good.split('.')
    const content = JSON.parse(Buffer.from(payload, 'base64url').toString()) as object
    const changed = Buffer.from(JSON.stringify({ ...content, c: 0 })).toString('base64url')
    const stranger = (await testTown(testApp)).surveyor
    const colleague = await signInAs(testApp, await buildPerson(testApp, { organisationId: town.organisationId }))

    for (const cursor of [
      'x',
      '0',
      '.',
      good.slice(0, -3),
      `${changed}.${signature}`,
      `${payload}.`,
      `${good}.x`,
      '"',
      '%00',
    ]) {
      const answer = await pull({ cursor })
      expect([cursor, answer.status, answer.body.code]).toEqual([cursor, 400, 'cursor-not-usable'])
    }
    for (const person of [stranger, colleague]) {
      expect((await pull({ cursor: good }, person)).body.code).toBe('cursor-not-usable')
    }
    expect((await pull({ cursor: good })).status).toBe(200)
    expect((await pull({ cursor: 'x'.repeat(2_001) })).status).toBe(422)
  })

  it('serves every device of its person', async () => {
    const { cursor } = (await pull({})).body as { cursor: string }
    const other = await town.secondPhone()

    expect((await pull({ cursor }, other.person)).status).toBe(200)
  })
})
