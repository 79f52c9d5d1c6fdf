import { randomUUID } from 'node:crypto'
import { gzipSync } from 'node:zlib'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { assertNothingLost, testPhone } from './testPhone'
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
const count = async (table: 'applied_mutation' | 'sheet' | 'quarantine' | 'conflict') => {
  const rows = await testApp.owner.rows<{ n: number }>(
    `SELECT count(*)::integer AS n FROM ${table} WHERE organisation_id = $organisationId`,
    { organisationId: town.organisationId },
  )
  return rows[0]?.n
}
const head = async () => {
  const [row] = await testApp.owner.rows<{ head: string }>(
    'SELECT head FROM organisation WHERE organisation_id = $organisationId',
    { organisationId: town.organisationId },
  )
  return Number(row?.head)
}

describe('handing in', () => {
  it('P1 applies a bag in order and shows it by pull', async () => {
    const { phone } = town
    await phone.pull()
    phone.saveSheet(sheetId, { finding: { kind: 'standing' }, ...storeys(2) })
    phone.saveSheet(sheetId, { footprint: { footprintM2: 100, knownBy: 'register' } })

    const answer = await phone.push()
    await phone.pull()

    expect(answer.results.map(({ status }) => status)).toEqual(['applied', 'applied'])
    expect(answer).toMatchObject({ lastSeq: 2, minSchema: 1 })
    expect(phone.bag).toEqual([])
    expect(phone.sheet(sheetId)?.fields).toMatchObject({
      answers: { finding: { kind: 'standing' }, ...storeys(2), footprint: { footprintM2: 100, knownBy: 'register' } },
      review: { state: 'handed-in' },
      revision: 1,
      recordedByName: 'Ann',
    })
    await assertNothingLost(testApp, [phone])
  })

  it('P1 keeps what follows from the answers beside them', async () => {
    const { phone } = town
    phone.saveSheet(sheetId, {
      finding: { kind: 'standing' },
      ...storeys(3),
      use: { use: 'office', knownBy: 'seen' },
      structure: { structure: 'steel-frame', knownBy: 'guessed' },
      footprint: { footprintM2: 200, knownBy: 'register' },
      attic: { floorShare: 0.5, knownBy: 'seen' },
      basement: { floorShare: 1, knownBy: 'told' },
      constructionYear: { kind: 'between', fromYear: 1950, toYear: 1960, knownBy: 'guessed' },
    })
    await phone.handIn()

    const [row] = await testApp.owner.rows(
      `SELECT finding, use, structure, year_from, year_to, footprint_m2, gross_floor_area_m2, floor_area_cv
       FROM sheet WHERE sheet_id = $sheetId`,
      { sheetId },
    )

    expect(row).toMatchObject({
      finding: 'standing',
      use: 'office',
      structure: 'steel-frame',
      year_from: 1950,
      year_to: 1960,
      footprint_m2: 200,
      gross_floor_area_m2: 200 * 4.5,
      floor_area_cv: expect.any(Number),
    })
  })

  it('P1 takes a packed body as well', async () => {
    const { phone, surveyor } = town
    phone.saveSheet(sheetId, { notes: { text: 'x'.repeat(3_000) } })
    const body = JSON.stringify({ deviceId: surveyor.deviceId, schema: 1, batch: phone.bag })

    const answer = await testApp.http
      .post('/api/v1/sync/push')
      .set(surveyor.bearer)
      .set('Content-Type', 'application/json')
      .set('Content-Encoding', 'gzip')
      .serialize((packed) => packed as unknown as string)
      .send(gzipSync(body))

    expect(answer.body.results).toMatchObject([{ status: 'applied' }])
  })

  it('F2 F5 F7 P2 answers a batch that comes again as the first time, with one effect', async () => {
    const { phone } = town
    phone.saveSheet(sheetId, storeys(2))
    phone.saveSheet(sheetId, { storeys: { aboveGround: 2.3, knownBy: 'seen' } })
    phone.saveSheet(sheetId, storeys(3))
    const first = await phone.push()
    const headAfter = await head()

    const again = await phone.push()

    expect(first.results.map(({ status }) => status)).toEqual(['applied', 'rejected', 'applied'])
    expect(again.results.map(({ status }) => status)).toEqual(['replay', 'rejected', 'replay'])
    expect(again.results.map(({ change }) => change)).toEqual(first.results.map(({ change }) => change))
    expect(again.results[1]?.problem).toEqual(first.results[1]?.problem)
    expect([await head(), await count('applied_mutation'), await count('quarantine')]).toEqual([headAfter, 3, 1])
    await phone.handIn()
    await assertNothingLost(testApp, [phone])
  })

  it('F5 P2 has one effect when a batch comes several times at once', async () => {
    const { phone } = town
    for (let storey = 1; storey <= 20; storey += 1) phone.saveSheet(sheetId, storeys(storey))

    const answers = await Promise.all([phone.push(), phone.push(), phone.push(), phone.push()])

    const changes = answers.map(({ results }) => results.map(({ change }) => change))
    expect(new Set(changes.map((list) => JSON.stringify(list))).size).toBe(1)
    expect(
      answers.flatMap(({ results }) => results.map(({ status }) => status)).filter((status) => status === 'applied')
        .length,
    ).toBe(20)
    expect([await count('applied_mutation'), await count('conflict')]).toEqual([20, 0])
    await phone.handIn()
    await assertNothingLost(testApp, [phone])
  })

  it('F6 P3 refuses a batch that overtook another, judges nothing of it, and names the number', async () => {
    const { phone } = town
    for (let storey = 1; storey <= 6; storey += 1) phone.saveSheet(sheetId, storeys(storey))
    const [early, late] = [phone.bag.slice(0, 3), phone.bag.slice(3)]

    await expect(phone.push(late)).rejects.toMatchObject({ status: 409, code: 'sequence-gap', expected: 1 })
    expect(await count('applied_mutation')).toBe(0)
    await phone.push(early)
    await phone.push(late)
    await phone.pull()

    expect(phone.sheet(sheetId)?.fields.answers).toEqual(storeys(6))
    await assertNothingLost(testApp, [phone])
  })

  it('F3 leaves nothing half when the server fails before its commit, and takes the batch once after', async () => {
    const { phone } = town
    const before = await head()
    await testApp.owner.run(
      `CREATE FUNCTION break_off() RETURNS trigger LANGUAGE plpgsql AS 'BEGIN RAISE EXCEPTION ''broken off''; END'`,
    )
    await testApp.owner.run('CREATE TRIGGER break_off BEFORE INSERT ON applied_mutation EXECUTE FUNCTION break_off()')
    phone.saveSheet(sheetId, storeys(2))

    await expect(phone.push()).rejects.toMatchObject({ status: 500, code: 'fault-of-ours' })
    const after = [await head(), await count('sheet'), await count('applied_mutation')]
    await testApp.owner.run('DROP FUNCTION break_off() CASCADE')
    await phone.handIn()

    expect(after).toEqual([before, 0, 0])
    expect([await count('sheet'), await count('applied_mutation'), phone.bag.length]).toEqual([1, 1, 0])
  })

  it('P6 refuses a batch whose ids and numbers cannot be read, naming each place', async () => {
    const { phone } = town
    const good = phone.saveSheet(sheetId, storeys(2))

    for (const batch of [
      [good, { ...good, id: 'x' }, 7, null],
      [{ ...good, seq: 2 }, good],
    ]) {
      await expect(phone.push(batch as object[])).rejects.toMatchObject({ status: 422, code: 'input-not-usable' })
    }
    const answer = phone.push([good, { ...good, id: 'x' }, 7, null] as object[])
    await expect(answer).rejects.toMatchObject({
      faults: [{ pointer: '/body/batch/1' }, { pointer: '/body/batch/2' }, { pointer: '/body/batch/3' }],
    })
    expect(await count('applied_mutation')).toBe(0)
  })
})

describe('a phone that was restored from a copy', () => {
  it('F16 P4 is told so, goes on under a new device id, and neither loses nor doubles work', async () => {
    const { phone, surveyor } = town
    const [, otherId = ''] = town.round.buildingIds
    phone.saveSheet(sheetId, storeys(1))
    await phone.push()
    // The copy: it has one entry, and no answer for it.
    const copy = testPhone(testApp, surveyor)
    copy.bag.push(...phone.bag)
    copy.saved.push(...phone.saved)
    phone.saveSheet(sheetId, storeys(2))
    await phone.handIn()
    const lost = { ...phone.saved[1], id: randomUUID(), entity: otherId, set: storeys(7) }
    copy.bag.push(lost as (typeof copy.bag)[number])
    copy.saved.push(lost as (typeof copy.bag)[number])

    await expect(copy.push()).rejects.toMatchObject({ status: 409, code: 'sequence-fork', expected: 3 })
    const newDeviceId = randomUUID()
    const renewed = await testApp.http
      .post('/api/v1/sync/device')
      .set(surveyor.bearer)
      .send({ deviceId: newDeviceId, name: 'Test phone' })
    const bearer = { Authorization: `Bearer ${renewed.body.accessToken}` }
    const again = testPhone(testApp, { ...surveyor, deviceId: newDeviceId, bearer })
    again.bag.push(...copy.bag.map((mutation, index) => ({ ...mutation, seq: index + 1 })))
    again.saved.push(...copy.saved)
    const answer = await again.push()
    await again.pull()

    expect(answer.results.map(({ status }) => status)).toEqual(['replay', 'applied'])
    expect(again.sheet(sheetId)?.fields.answers).toEqual(storeys(2))
    expect(again.sheet(otherId)?.fields.answers).toEqual(storeys(7))
    expect([again.bag.length, await count('conflict'), await count('applied_mutation')]).toEqual([0, 0, 3])
    expect(
      (await again.push(again.saved.map((mutation, index) => ({ ...mutation, seq: index + 1 })))).results,
    ).toMatchObject([{ status: 'replay' }, { status: 'replay' }])
    await assertNothingLost(testApp, [phone, again])
  })

  it('P4 keeps the session when the answer of renewing was lost, and takes no device of somebody else', async () => {
    const { surveyor, planner } = town
    const deviceId = randomUUID()
    const renew = (bearer: { Authorization: string }, id: string) =>
      testApp.http.post('/api/v1/sync/device').set(bearer).send({ deviceId: id, name: 'Test phone' })

    const first = await renew(surveyor.bearer, deviceId)
    const again = await renew({ Authorization: `Bearer ${first.body.accessToken}` }, deviceId)
    const other = await renew({ Authorization: `Bearer ${again.body.accessToken}` }, planner.deviceId)

    expect([first.status, again.status, other.status]).toEqual([200, 200, 409])
    expect(other.body.code).toBe('device-of-another-person')
    expect((await testApp.http.get('/api/v1/account').set(surveyor.bearer)).status).toBe(401)
    expect(
      (await testApp.http.get('/api/v1/account').set({ Authorization: `Bearer ${again.body.accessToken}` })).status,
    ).toBe(200)
  })

  it('P5 sets apart other work under an id that was used, and says the same each time', async () => {
    const { phone } = town
    const first = phone.saveSheet(sheetId, storeys(2))
    await phone.push()
    phone.bag.push({ ...first, seq: 2, set: storeys(3) } as never)

    const answers = [await phone.push(), await phone.push()]

    for (const { results } of answers) {
      expect(results).toMatchObject([{ status: 'replay' }, { status: 'rejected', problem: { code: 'id-reused' } }])
    }
    expect([await count('applied_mutation'), await count('quarantine')]).toEqual([1, 1])
    await phone.pull()
    expect(phone.sheet(sheetId)?.fields.answers).toEqual(storeys(2))
  })
})

describe('one bad entry among good ones', () => {
  const poisons: [string, (good: object) => object][] = [
    ['cannot be used', (good) => ({ ...good, set: { storeys: { aboveGround: 2.3 } } })],
    ['is too large', (good) => ({ ...good, set: { notes: { text: 'x'.repeat(70_000) } } })],
    ['is forbidden', (good) => ({ ...good, entity: randomUUID() })],
    ['reaches into prototypes', (good) => ({ ...good, set: JSON.parse('{"__proto__":{"a":1}}') as object })],
    ['has a text that cannot be kept', (good) => ({ ...good, set: { notes: { text: 'a\u0000b' } } })],
    ['has half a character', (good) => ({ ...good, set: { notes: { text: '\ud83d' } } })],
    [
      'is nested deeply',
      (good) => ({ ...good, set: JSON.parse(`${'{"a":'.repeat(2_000)}1${'}'.repeat(2_000)}`) as object }),
    ],
  ]

  it.each(poisons)('F23 P6 that %s is set apart with its reason; the others go on', async (_kind, poison) => {
    const { phone } = town
    for (let index = 0; index < 60; index += 1) phone.saveSheet(sheetId, storeys(1 + (index % 50)))
    phone.bag[30] = poison(phone.bag[30]!) as (typeof phone.bag)[number]

    const { results, lastSeq } = await phone.push()
    await phone.pull()

    expect(results.filter(({ status }) => status === 'applied').length).toBe(59)
    expect(results[30]).toMatchObject({ status: 'rejected', problem: { detail: expect.stringMatching(/set apart/) } })
    expect([lastSeq, phone.bag.length, await count('quarantine')]).toEqual([60, 0, 1])
    await assertNothingLost(testApp, [phone])
    expect(Object.prototype).not.toHaveProperty('a')
  })

  it('F23 P6 takes 499 of 500', async () => {
    const town500 = await testTown(testApp, { outlineCount: 500 })
    for (const id of town500.round.buildingIds)
      town500.phone.saveSheet(id, { ...storeys(2), finding: { kind: 'standing' } })
    town500.phone.bag[250] = { ...town500.phone.bag[250]!, seen: -1 } as never

    const { results } = await town500.phone.push()
    await town500.phone.pull()

    expect(results.filter(({ status }) => status === 'applied').length).toBe(499)
    expect(town500.phone.of('sheet').length).toBe(499)
    await assertNothingLost(testApp, [town500.phone])
  })

  it('F23 P7 blocks what needs a thing whose making was rejected, in this batch and the next, until it is made', async () => {
    const { phone } = town
    const photo = (photoId: string) => ({
      op: 'set' as const,
      type: 'photo' as const,
      entity: photoId,
      set: {
        photoId,
        sheetId,
        sha256: 'a'.repeat(64),
        bytes: 9,
        mime: 'image/jpeg',
        widthPx: 4,
        heightPx: 4,
        tag: 'rear',
        takenAt: null,
      },
    })
    const cause = phone.saveSheet(sheetId, { storeys: { aboveGround: 2.3, knownBy: 'seen' } })
    phone.save(photo(randomUUID()))
    phone.save({ op: 'delete', type: 'sheet', entity: sheetId })
    const together = await phone.push()
    phone.save(photo(randomUUID()))
    const next = await phone.push(phone.bag.slice(3))
    phone.saveSheet(sheetId, storeys(2))
    phone.save(photo(randomUUID()))
    const mended = await phone.push(phone.bag.slice(4))

    expect(together.results.map(({ status }) => status)).toEqual(['rejected', 'blocked', 'blocked'])
    expect(next.results).toMatchObject([
      { status: 'blocked', problem: { code: 'blocked', faults: [{ code: 'waits-for', detail: cause.id }] } },
    ])
    expect(mended.results.map(({ status }) => status)).toEqual(['applied', 'applied'])
    await phone.handIn()
    await assertNothingLost(testApp, [phone])
  })

  it('P6 says what is wrong when something that is not there is deleted or settled', async () => {
    const { phone } = town
    phone.save({ op: 'delete', type: 'sheet', entity: sheetId })
    phone.save({ op: 'delete', type: 'photo', entity: randomUUID() })
    phone.save({ op: 'resolve', type: 'conflict', entity: randomUUID(), set: { choice: 'kept' } })

    const { results } = await phone.push()

    expect(results.map(({ problem }) => problem?.code)).toEqual(['nothing-there', 'nothing-there', 'conflict-unknown'])
  })
})

describe('versions of the wire', () => {
  it('F20 P12 takes nothing of a version it does not know, and lets it pull', async () => {
    const { phone, surveyor } = town
    phone.saveSheet(sheetId, storeys(2))
    const push = (schema: number) =>
      testApp.http
        .post('/api/v1/sync/push')
        .set(surveyor.bearer)
        .send({ deviceId: surveyor.deviceId, schema, batch: phone.bag })

    const newer = await push(99)
    const pulled = await testApp.http
      .get('/api/v1/sync/pull')
      .query({ deviceId: surveyor.deviceId, schema: 99 })
      .set(surveyor.bearer)

    expect([newer.status, newer.body.code]).toEqual([409, 'server-too-old'])
    expect([pulled.status, pulled.body.minSchema]).toEqual([200, 1])
    expect(await count('applied_mutation')).toBe(0)
  })
})
