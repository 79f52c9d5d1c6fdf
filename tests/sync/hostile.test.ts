import { randomUUID } from 'node:crypto'
import { gzipSync } from 'node:zlib'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { assertNothingLost } from './testPhone'
import { testTown, type TestTown } from './testTown'

let testApp: TestApp
let town: TestTown
let sheetId: string
beforeAll(async () => {
  testApp = await createTestApp()
})
afterAll(() => testApp.close())
beforeEach(async () => {
  town = await testTown(testApp)
  sheetId = town.round.buildingIds[0] ?? ''
})

const storeys = (aboveGround: number) => ({ storeys: { aboveGround, knownBy: 'seen' as const } })
const pushText = (text: string) =>
  testApp.http.post('/api/v1/sync/push').set(town.surveyor.bearer).type('json').send(text)
const sheetRow = async () =>
  (
    await testApp.owner.rows<Record<string, unknown>>(
      'SELECT * FROM sheet WHERE organisation_id = $organisationId AND sheet_id = $sheetId',
      { organisationId: town.organisationId, sheetId },
    )
  )[0]

describe('M1 fields that are not to be written', () => {
  it.each([
    ['organisation', { organisation: randomUUID() }, {}],
    ['change_no', { change_no: 1 }, {}],
    ['recordedBy', { recordedBy: randomUUID() }, {}],
    ['role', { role: 'steward' }, {}],
    ['review state', {}, { review: { state: 'checked' } }],
    ['state', {}, { state: 'checked' }],
    ['revision', {}, { revision: 9 }],
    ['versions', {}, { versions: { storeys: 0 } }],
    ['grossFloorAreaM2', {}, { grossFloorAreaM2: 1e9 }],
  ])('%s is set apart, and nothing of it is stored', async (_name, extra, inSet) => {
    const good = town.phone.saveSheet(sheetId, storeys(2))
    town.phone.bag[0] = { ...good, ...extra, set: { ...storeys(2), ...inSet } } as never

    const { results } = await town.phone.push()

    expect(results).toMatchObject([{ status: 'rejected', problem: { code: 'mutation-not-usable' } }])
    expect(await sheetRow()).toBeUndefined()
  })

  it('leaves prototypes clean, in the batch and beside it', async () => {
    const good = town.phone.saveSheet(sheetId, storeys(2))
    const text = JSON.stringify({ deviceId: town.surveyor.deviceId, schema: 1, batch: ['GOOD'] }).replace(
      '"GOOD"',
      JSON.stringify(good).replace('"set":{', '"set":{"__proto__":{"isSteward":true},'),
    )
    const inBatch = await pushText(text)
    const beside = await pushText(
      text.replace('"schema":1', '"schema":1,"__proto__":{"isSteward":true},"constructor":1'),
    )

    expect([inBatch.status, beside.status]).toEqual([200, 200])
    expect(inBatch.body.results).toMatchObject([{ status: 'rejected' }])
    expect({}).not.toHaveProperty('isSteward')
  })
})

describe('M3 things of another organisation', () => {
  it('are neither seen nor touched by their ids, in the words for what is not there', async () => {
    const stranger = await testTown(testApp)
    const [theirs = ''] = stranger.round.buildingIds
    stranger.phone.saveSheet(theirs, storeys(2))
    await stranger.phone.handIn()
    const before = stranger.phone.sheet(theirs)
    town.phone.saveSheet(theirs, storeys(9))
    town.phone.save({ op: 'delete', type: 'sheet', entity: theirs })
    town.phone.saveSheet(randomUUID(), storeys(9))

    const { results } = await town.phone.push()
    await stranger.phone.pull()

    expect(new Set(results.map(({ problem }) => JSON.stringify(problem))).size).toBe(1)
    expect(results[0]).toMatchObject({ status: 'rejected', problem: { code: 'not-in-your-beats' } })
    expect(stranger.phone.sheet(theirs)).toEqual(before)
    await assertNothingLost(testApp, [town.phone, stranger.phone])
  })

  it('leave a mutation id free for each organisation', async () => {
    const stranger = await testTown(testApp)
    const mine = town.phone.saveSheet(sheetId, storeys(2))
    await town.phone.push()
    stranger.phone.bag.push({ ...mine, entity: stranger.round.buildingIds[0] } as never)

    expect((await stranger.phone.push()).results).toMatchObject([{ status: 'applied' }])
  })
})

describe('M4 texts that look like statements', () => {
  it.each([`'; DROP TABLE sheet; --`, `$1 $organisationId :x ?`, `\\'; SELECT pg_sleep(9); --`, `{{7*7}} \${7*7}`])(
    'keeps %s as it is',
    async (text) => {
      town.phone.saveSheet(sheetId, { notes: { text }, suspicions: { seen: [text] } })
      await town.phone.handIn()

      expect(town.phone.sheet(sheetId)?.fields.answers).toEqual({ notes: { text }, suspicions: { seen: [text] } })
    },
  )

  it('refuses one as an id or a number of the query', async () => {
    for (const query of [{ limit: '1; DROP TABLE sheet' }, { deviceId: `' OR 1=1` }, { schema: '1e9x' }]) {
      const answer = await testApp.http
        .get('/api/v1/sync/pull')
        .query({ deviceId: town.surveyor.deviceId, schema: 1, ...query })
        .set(town.surveyor.bearer)
      expect(answer.status).toBe(422)
    }
  })
})

describe('M6 bodies that are too much', () => {
  const wrap = (batch: string) => `{"deviceId":"${town.surveyor.deviceId}","schema":1,"batch":[${batch}]}`
  const packed = (text: string) =>
    testApp.http
      .post('/api/v1/sync/push')
      .set(town.surveyor.bearer)
      .set('Content-Type', 'application/json')
      .set('Content-Encoding', 'gzip')
      .serialize((bytes) => bytes as unknown as string)
      .send(gzipSync(text, { level: 9 }))

  it.each<[string, () => PromiseLike<{ status: number }>, number[]]>([
    ['10 MB of JSON', () => pushText(wrap(`"${'x'.repeat(10_000_000)}"`)), [413]],
    ['200 MB in a packed body of 200 kB', () => packed(wrap(`"${'x'.repeat(200_000_000)}"`)), [413]],
    ['10,000 levels', () => pushText(wrap(`${'['.repeat(10_000)}${']'.repeat(10_000)}`)), [422]],
    [
      '150,000 keys',
      () => pushText(wrap(`{${Array.from({ length: 150_000 }, (_, i) => `"k${i}":1`).join(',')}}`)),
      [422],
    ],
    ['a body that breaks off', () => pushText('{"deviceId":'), [400]],
    ['NaN', () => pushText(wrap('NaN')), [400]],
    ['501 entries', () => pushText(wrap(Array(501).fill('{}').join(','))), [422]],
    ['no entries', () => pushText(wrap('')), [422]],
    ['a list for a body', () => pushText('[1,2]'), [422]],
  ])('%s is refused at once', async (_kind, send, statuses) => {
    const rssBefore = process.memoryUsage().rss

    const { status } = await send()

    expect(statuses).toContain(status)
    expect((process.memoryUsage().rss - rssBefore) / 1e6).toBeLessThan(400)
    expect(await sheetRow()).toBeUndefined()
  })

  it('takes the last of two equal keys, numbers beyond all range not at all', async () => {
    const good = JSON.stringify(town.phone.saveSheet(sheetId, storeys(2)))
    const twice = good.replace('"aboveGround":2', '"aboveGround":9,"aboveGround":3')
    const endless = good
      .replace('"seq":1', '"seq":2')
      .replace(/"id":"[^"]*"/, `"id":"${randomUUID()}"`)
      .replace('"aboveGround":2', '"aboveGround":1e999')

    const { body } = await pushText(wrap(`${twice},${endless}`))

    expect(body.results).toMatchObject([{ status: 'applied' }, { status: 'rejected' }])
    expect((await sheetRow())?.answers).toEqual(storeys(3))
  })
})

describe('M16 another device', () => {
  it('cannot hand in or pull under the token of this one, nor guess its number', async () => {
    const other = await town.secondPhone()
    town.phone.saveSheet(sheetId, storeys(2))
    const body = { schema: 1, batch: town.phone.bag }

    for (const deviceId of [other.person.deviceId, randomUUID()]) {
      const push = await testApp.http
        .post('/api/v1/sync/push')
        .set(town.surveyor.bearer)
        .send({ ...body, deviceId })
      const pull = await testApp.http.get('/api/v1/sync/pull').query({ deviceId, schema: 1 }).set(town.surveyor.bearer)
      expect([push.status, push.body.code]).toEqual([403, 'other-device'])
      expect([pull.status, pull.body.code]).toEqual([403, 'other-device'])
    }
    expect(await sheetRow()).toBeUndefined()
  })
})
