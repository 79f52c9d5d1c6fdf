import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { QueryTypes, type Transaction } from 'sequelize'
import { retryOnContention } from '@/server/commands/retryOnContention'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { assertNothingLost } from './testPhone'
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

const databaseError = (code: string) => Object.assign(new Error('of the database'), { original: { code } })
const hold = (transaction: Transaction) =>
  testApp.owner.sequelize.query('SELECT 1 FROM organisation WHERE organisation_id = $organisationId FOR UPDATE', {
    bind: { organisationId: town.organisationId },
    type: QueryTypes.SELECT,
    transaction,
  })

describe('F28 P11 transactions that meet', () => {
  it.each(['40001', '40P01', '55P03', '57014'])('are tried three times over %s, then answered 503', async (code) => {
    let tries = 0
    const twice = retryOnContention(async () => {
      tries += 1
      if (tries < 3) throw databaseError(code)
      return 'done'
    })
    expect([await twice, tries]).toEqual(['done', 3])

    const never = retryOnContention(() => Promise.reject(databaseError(code)))
    await expect(never).rejects.toMatchObject({ status: 503, code: 'busy', headers: { 'Retry-After': '2' } })
  })

  it('are not tried again over other faults', async () => {
    let tries = 0
    const other = retryOnContention(async () => {
      tries += 1
      throw databaseError('23505')
    })

    await expect(other).rejects.toThrow('of the database')
    expect(tries).toBe(1)
  })

  it('wait for a short lock, and give up on a long one with nothing half', async () => {
    town.phone.saveSheet(town.round.buildingIds[0] ?? '', { finding: { kind: 'inaccessible' } })
    const long = await testApp.owner.sequelize.transaction()
    await hold(long)
    const busy = await town.phone.push().catch((error: unknown) => error)
    await long.rollback()
    const short = await testApp.owner.sequelize.transaction()
    await hold(short)
    const pushing = town.phone.push()
    await new Promise((resolve) => setTimeout(resolve, 300))
    await short.rollback()

    expect(busy).toMatchObject({ status: 503, code: 'busy' })
    expect((await pushing).results).toMatchObject([{ status: 'applied' }])
    await town.phone.handIn()
    await assertNothingLost(testApp, [town.phone])
  }, 60_000)

  it('lose nothing when twenty phones hand in, planners check and beats move at once', async () => {
    const busy = await testTown(testApp, { outlineCount: 20 })
    const phones = await Promise.all(Array.from({ length: 20 }, () => busy.secondPhone()))
    const check = async () => {
      const queue = await testApp.http.get('/api/v1/review/queue').set(busy.planner.bearer)
      for (const { sheetId } of queue.body.sheets as { sheetId: string }[]) {
        const sheet = await testApp.http.get(`/api/v1/sheets/${sheetId}`).set(busy.planner.bearer)
        const body = { sheets: [{ sheetId, change: sheet.body.change }] }
        expect((await testApp.http.post('/api/v1/review/check').set(busy.planner.bearer).send(body)).status).toBe(200)
      }
    }
    const move = async (outlines: readonly string[]) => {
      const path = `/api/v1/rounds/${busy.round.roundId}/beats/${busy.beat.beatId}`
      const body = { name: 'Beat 1', surveyorId: busy.surveyor.personId, outlineIds: outlines }
      expect((await testApp.http.put(path).set(busy.planner.bearer).send(body)).status).toBe(200)
    }
    await Promise.all([
      ...phones.map(async (phone, index) => {
        for (let turn = 0; turn < 4; turn += 1) {
          phone.saveSheet(busy.round.buildingIds[(index + turn) % 20] ?? '', { notes: { text: `${index} ${turn}` } })
          await phone.handIn()
        }
      }),
      check(),
      move(busy.round.outlineIds.slice(0, 10)).then(() => move(busy.round.outlineIds)),
    ])
    for (const phone of phones) await phone.pull()

    const [first] = phones
    for (const phone of phones) expect(phone.base).toEqual(first?.base)
    expect(phones.flatMap(({ apart }) => apart)).toEqual([])
    await assertNothingLost(testApp, phones)
  }, 60_000)
})
