import { once } from 'node:events'
import { createServer, type Server } from 'node:http'
import { connect, type AddressInfo, type Socket } from 'node:net'
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { judgeMutation } from '@/shared/sync/judgeMutation'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
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
  town = await testTown(testApp, { outlineCount: 40 })
})

const storeys = (aboveGround: number) => ({ storeys: { aboveGround, knownBy: 'seen' as const } })
const sheets = () =>
  testApp.owner.rows<{ answers: unknown; revision: number }>(
    'SELECT answers, revision FROM sheet WHERE organisation_id = $organisationId ORDER BY answers::text',
    { organisationId: town.organisationId },
  )

describe('F4 a database that goes away in the middle', () => {
  it('P11 answers 503, takes nothing half, and takes the same batches once when it is back', async () => {
    const phones = [town.phone, ...(await Promise.all(Array.from({ length: 9 }, () => town.secondPhone())))]
    phones.forEach((phone, number) => {
      for (const id of town.round.buildingIds.slice(number * 4, number * 4 + 4))
        phone.saveSheet(id, storeys(number + 1))
    })
    const pushes = phones.map((phone) =>
      phone.push().then(
        () => 200,
        (error: { status?: number }) => error.status,
      ),
    )
    for (let turn = 0; turn < 4; turn += 1) {
      await testApp.owner
        .rows(
          `SELECT pg_terminate_backend(pid) FROM pg_stat_activity
         WHERE datname = current_database() AND usename <> current_user AND state <> 'idle'`,
        )
        .catch(() => [])
      await new Promise((resolve) => setTimeout(resolve, 15))
    }
    const statuses = await Promise.all(pushes)
    expect(statuses.every((status) => status === 200 || status === 503 || status === 500)).toBe(true)

    for (const phone of phones) await phone.handIn()

    expect(await sheets()).toHaveLength(40)
    await assertNothingLost(testApp, phones)
  })
})

describe('F9 a session that ended while the phone was off', () => {
  it('refuses the old token after nine days and takes 300 entries once after signing in', async () => {
    for (let turn = 0; turn < 300; turn += 1)
      town.phone.saveSheet(town.round.buildingIds[turn % 40]!, storeys(turn + 1))
    testApp.context.clock.advanceMs(9 * 86_400_000)
    await expect(town.phone.push()).rejects.toMatchObject({ status: 401 })
    const again = await signInAs(testApp, town.surveyor, { deviceId: town.surveyor.deviceId })
    const same = testPhone(testApp, again)
    same.bag.push(...town.phone.bag)
    same.saved.push(...town.phone.saved)

    await same.handIn()

    expect(same.bag).toEqual([])
    expect(await sheets()).toHaveLength(40)
    await assertNothingLost(testApp, [same])
  })
})

describe('F18 a long backlog', () => {
  it('goes on where it was through five breaks, each entry once', async () => {
    for (let turn = 0; turn < 2_000; turn += 1)
      town.phone.saveSheet(town.round.buildingIds[turn % 40]!, storeys(turn % 90))
    for (const size of [500, 120, 500, 1, 300]) {
      // the answer is lost each time: the phone sends the same again, and more
      await town.phone.push(town.phone.bag.slice(0, size))
    }
    await town.phone.pull()
    await town.phone.handIn()

    const [row] = await testApp.owner.rows<{ count: number; last: number }>(
      `SELECT count(*)::integer AS count, max(seq)::integer AS last FROM applied_mutation WHERE organisation_id = $organisationId`,
      { organisationId: town.organisationId },
    )
    expect(row).toEqual({ count: 2_000, last: 2_000 })
    await assertNothingLost(testApp, [town.phone])
  })
})

describe('F19 clocks that jump', () => {
  it('order nothing: the same work under any clock ends in the same sheets', async () => {
    const play = async (clockOf: (turn: number) => string) => {
      town = await testTown(testApp, { outlineCount: 4 })
      const other = await town.secondPhone()
      for (let turn = 0; turn < 12; turn += 1) {
        const phone = turn % 2 === 0 ? town.phone : other
        phone.saveSheet(town.round.buildingIds[turn % 4]!, storeys(turn + 1))
        Object.assign(phone.bag.at(-1)!, { at: clockOf(turn) })
        if (turn % 3 === 0) await phone.handIn()
      }
      for (const phone of [town.phone, other, town.phone]) await phone.handIn()
      await assertNothingLost(testApp, [town.phone, other])
      return sheets()
    }
    const jumping = ['1970-01-01T00:00:00Z', '2099-12-31T23:59:59+14:00', '2028-02-29T12:00:00-11:00']

    expect(await play((turn) => jumping[turn % 3]!)).toEqual(await play(() => '2026-11-30T10:12:03+01:00'))
  })
})

describe('F27 connections that say nothing', () => {
  let server: Server
  const sockets: Socket[] = []
  beforeAll(async () => {
    server = createServer(testApp.app).listen(0, '127.0.0.1')
    await once(server, 'listening')
  })
  afterEach(() => sockets.splice(0).forEach((socket) => socket.destroy()))
  afterAll(() => new Promise((resolve) => server.close(resolve)))

  it('do not keep others waiting: four hundred idle ones, half of them in the middle of a header', async () => {
    const { port } = server.address() as AddressInfo
    for (let number = 0; number < 400; number += 1) {
      const socket = connect(port, '127.0.0.1')
      socket.on('error', () => undefined)
      sockets.push(socket)
      if (number % 2 === 0) socket.write('POST /api/v1/sync/push HTTP/1.1\r\nHost: x\r\nX-Slow: ')
    }
    await Promise.all(sockets.map((socket) => (socket.connecting ? once(socket, 'connect') : undefined)))
    const startMs = performance.now()
    const answer = await fetch(
      `http://127.0.0.1:${port}/api/v1/sync/pull?deviceId=${town.surveyor.deviceId}&schema=1`,
      {
        headers: town.surveyor.bearer,
      },
    )

    expect(answer.status).toBe(200)
    expect(performance.now() - startMs).toBeLessThan(5_000)
    // Node ends a header that does not come within this time
    expect(server.headersTimeout).toBeLessThanOrEqual(60_000)
  })
})

describe('M18 texts that make a bad pattern think for ever', () => {
  const texts = ['a'.repeat(5_000) + '!', `${'0'.repeat(5_000)}Z`, `${'-'.repeat(5_000)}`, `${'2026-'.repeat(1_000)}`]

  it.each(['id', 'entity', 'at', 'op', 'type', 'notes'])('are judged at once as %s', (field) => {
    const [entity] = town.round.buildingIds
    const core = {
      id: entity,
      seq: 1,
      op: 'set',
      type: 'sheet',
      entity,
      seen: 0,
      at: '2026-11-30T10:00:00Z',
      elapsedMs: 1,
    }
    for (const text of texts) {
      const payload =
        field === 'notes' ? { ...core, set: { notes: { text } } } : { ...core, set: storeys(1), [field]: text }
      const startMs = performance.now()
      judgeMutation(payload)
      expect(performance.now() - startMs).toBeLessThan(200)
    }
  })
})

describe('M13 texts that look like pages', () => {
  it('come back as they were written, as JSON that no browser takes for a page', async () => {
    const text = '<img src=x onerror=alert(1)><script>alert(2)</script>'
    town.phone.saveSheet(town.round.buildingIds[0]!, { notes: { text } })
    await town.phone.handIn()
    const answer = await testApp.http
      .get('/api/v1/sync/pull')
      .query({ deviceId: town.surveyor.deviceId, schema: 1 })
      .set(town.surveyor.bearer)

    expect(town.phone.sheet(town.round.buildingIds[0]!)?.fields.answers.notes?.text).toBe(text)
    expect(answer.get('Content-Type')).toContain('application/json')
    expect(answer.get('X-Content-Type-Options')).toBe('nosniff')
    expect(answer.get('Content-Security-Policy')).not.toContain("'unsafe-inline' 'unsafe-eval'")
  })
})
