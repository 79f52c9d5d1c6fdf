import { mkdtemp } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { demoId } from '@/server/demo/seeding.types'
import { seedDemo } from '@/server/demo/seedDemo'
import { DEMO_PASSWORD } from '@/server/demo/townNames'
import type { LoadReceipt } from '@/shared/api/receipts'
import type { Receipt } from '@/shared/schemas/receipt'
import type { RunResult, RunSummary } from '@/shared/schemas/run'
import { buildPerson } from '@/tests/support/buildPerson'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { signInAs } from '@/tests/support/signInAs'

const total = (parts: readonly { massKg: number }[]) => parts.reduce((sum, { massKg }) => sum + massKg, 0)

/** Equal to 1e-9 of the figure. */
function expectSum(parts: readonly { massKg: number }[], massKg: number): void {
  expect(Math.abs(total(parts) - massKg)).toBeLessThanOrEqual(1e-9 * massKg)
}

describe('receipts', () => {
  let app: TestApp
  let planner: string
  let contractor: string
  let run: RunSummary & { result: RunResult }

  const signInAt = async (email: string) => {
    const device = { deviceId: demoId(`device-of-${email}`), name: 'test' }
    const { body } = await app.http.post('/api/v1/auth/sign-in').send({ email, password: DEMO_PASSWORD, device })
    return `Bearer ${body.accessToken as string}`
  }
  const get = (address: string, bearer: string, query: object = {}) =>
    app.http.get(`/api/v1${address}`).query(query).set('Authorization', bearer)
  const receiptOf = async (query: object): Promise<Receipt> => {
    const { body, status } = await get(`/runs/${run.runId}/receipt`, planner, query)
    expect([status, body.detail]).toEqual([200, undefined])
    return body as Receipt
  }

  beforeAll(async () => {
    app = await createTestApp()
    await seedDemo(app.ownerUrl, await mkdtemp(path.join(tmpdir(), 'tally-photos-')))
    planner = await signInAt('planner@hythe.example')
    contractor = await signInAt('contractor@hythe.example')
    const started = await app.http
      .post('/api/v1/runs')
      .set('Authorization', planner)
      .send({
        roundId: demoId('round', 'kiln-2026'),
        editionId: demoId('edition', 1),
        scenario: {
          name: 'As it is',
          lifetimeOverrides: [{ use: 'all', model: 'weibull', meanYears: 120, sdYears: 50 }],
        },
      })
    run = (await get(`/runs/${started.body.runId as string}`, planner)).body
  })
  afterAll(() => app.close())

  it.each([
    ['all that stands', {}, (result: RunResult) => result.stock.total.meanKg],
    [
      'timber that stands',
      { material: 'timber' },
      (result: RunResult) => result.stock.byMaterial.find(({ material }) => material === 'timber')!.band.meanKg,
    ],
    [
      'what comes down in one year',
      { kind: 'demolition', fromYear: 2031, toYear: 2031 },
      (result: RunResult) => result.yearsAhead.demolition.total.meanKg[4]!,
    ],
    [
      'steel that comes down in thirty years',
      { kind: 'demolition', material: 'steel', fromYear: 2027, toYear: 2056 },
      ({ yearsAhead }: RunResult) =>
        yearsAhead.demolition.byMaterial.steel!.meanKg.slice(0, 30).reduce((sum, massKg) => sum + massKg, 0),
    ],
    [
      'what is renewed in ten years',
      { kind: 'refurbishment', fromYear: 2027, toYear: 2036 },
      ({ yearsAhead }: RunResult) =>
        yearsAhead.refurbishment.total.meanKg.slice(0, 10).reduce((sum, massKg) => sum + massKg, 0),
    ],
  ])('adds up to the figure, group by group and factor by factor: %s', async (_, query, figureOf) => {
    const receipt = await receiptOf(query)

    const figureKg = figureOf(run.result)
    expect(Math.abs(receipt.massKg - figureKg)).toBeLessThanOrEqual(1e-12 * figureKg)
    expectSum(receipt.groups, figureKg)
    for (const group of receipt.groups) {
      expectSum(group.terms, group.massKg)
      for (const { countedAreaM2, contentKgPerM2, massKg } of group.terms)
        expect(countedAreaM2 * contentKgPerM2).toBe(massKg)
    }
  })

  it('goes from a group to its buildings, which add up to the group', async () => {
    const { groups } = await receiptOf({ kind: 'demolition', material: 'all', fromYear: 2027, toYear: 2036 })
    const { use, structure, period, massKg, buildingCount } = groups[0]!

    const receipt = await receiptOf({ kind: 'demolition', fromYear: 2027, toYear: 2036, use, structure, period })

    expectSum(receipt.buildings, massKg)
    expect(receipt.buildings.length).toBeGreaterThanOrEqual(buildingCount)
    expect(receipt.buildings.every(({ chance }) => chance !== null && chance > 0 && chance < 1)).toBe(true)
  })

  it('ends at one building, whose parts are its mass in the run', async () => {
    const { body } = await get(`/runs/${run.runId}/buildings`, planner)
    const { buildingId, massKg } = body.buildings[3] as { buildingId: string; massKg: number }

    const receipt = await receiptOf({ buildingId })

    expectSum(receipt.buildings, massKg)
    expect(receipt.massKg).toBeCloseTo(massKg, 3)
  })

  it('names the source of each row it rests on, and what the scenario set in its place', async () => {
    const receipt = await receiptOf({ kind: 'demolition', material: 'timber', fromYear: 2027, toYear: 2027 })

    const known = new Set(receipt.factorRows.map(({ rowId }) => rowId))
    expect(receipt.groups.every(({ terms }) => terms.every(({ rowIds }) => rowIds.length > 0))).toBe(true)
    expect(receipt.groups.every(({ terms }) => terms.every(({ rowIds }) => rowIds.every((id) => known.has(id))))).toBe(
      true,
    )
    expect(receipt.factorRows.every(({ source, material }) => source.length > 5 && material === 'timber')).toBe(true)
    expect(receipt.lifetimes.every(({ isOfScenario, meanYears }) => isOfScenario && meanYears === 120)).toBe(true)
  })

  it('stays as it was when the sheets change afterwards', async () => {
    const before = await receiptOf({})
    await app.owner.run(`UPDATE sheet SET gross_floor_area_m2 = gross_floor_area_m2 * 2`)
    expect(await receiptOf({})).toEqual(before)
  })

  it('refuses years that are not of the run, in words, and a building that is not in it', async () => {
    const outside = await get(`/runs/${run.runId}/receipt`, planner, {
      kind: 'demolition',
      fromYear: 1990,
      toYear: 2030,
    })
    expect([outside.status, outside.body.faults[0].code]).toEqual([422, 'years-not-of-run'])

    const nowhere = await get(`/runs/${run.runId}/receipt`, planner, { buildingId: demoId('nowhere') })
    expect(nowhere.status).toBe(404)
  })

  it('opens to planners of the organisation alone', async () => {
    await receiptOf({})
    const stranger = (await signInAs(app, await buildPerson(app, { roles: ['planner', 'contractor'] }))).bearer
      .Authorization

    expect((await get(`/runs/${run.runId}/receipt`, stranger)).status).toBe(404)
    expect((await get(`/runs/${run.runId}/receipt`, contractor)).status).toBe(403)
  })

  it('opens a published line to its contractor, at the grain at which it was published', async () => {
    const published = await app.http
      .post('/api/v1/publications')
      .set('Authorization', planner)
      .send({ runId: run.runId, title: 'Kiln Quarter, loads', recipientIds: [demoId('person', 'contractor')] })
    const address = `/yard/publications/${published.body.publicationId as string}/receipt`
    const query = { code: '17 02 01', year: 2030, containerM3: 20, payloadT: 12 }

    const { body, status } = await get(address, contractor, query)
    expect(status).toBe(200)
    const { line, parts, sources } = body as LoadReceipt
    for (const level of ['low', 'likely', 'high'] as const)
      expect(parts.reduce((sum, { massKg }) => sum + massKg[level], 0)).toBeCloseTo(line.massKg[level], 6)
    expect(sources.length).toBeGreaterThan(0)
    expect(JSON.stringify(body)).not.toContain('buildingId')

    const other = await get(address, await signInAt('contractor2@hythe.example'), query)
    expect(other.status).toBe(404)
    expect((await get(address, contractor, { ...query, code: '99 99 99' })).status).toBe(404)
  })
})
