import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { demoId } from '@/server/demo/seeding.types'
import { seedDemo } from '@/server/demo/seedDemo'
import { DEMO_PASSWORD } from '@/server/demo/townNames'
import type { LoadsAhead } from '@/shared/api/publications'
import type { RunResult, RunSummary } from '@/shared/schemas/run'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { mkdtemp } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'

describe('from checked sheets to loads ahead', () => {
  let app: TestApp
  let planner: string
  let contractor: string
  let run: RunSummary & { result: RunResult }
  const roundId = demoId('round', 'kiln-2026')
  const editionId = demoId('edition', 1)

  const signInAt = async (email: string, device: string) => {
    const { body } = await app.http
      .post('/api/v1/auth/sign-in')
      .send({ email, password: DEMO_PASSWORD, device: { deviceId: demoId(device), name: 'test' } })
    return `Bearer ${body.accessToken as string}`
  }
  const start = (body: object) => app.http.post('/api/v1/runs').set('Authorization', planner).send(body)

  beforeAll(async () => {
    app = await createTestApp()
    await seedDemo(app.ownerUrl, await mkdtemp(path.join(tmpdir(), 'tally-photos-')))
    planner = await signInAt('planner@hythe.example', 'device-planner')
    contractor = await signInAt('contractor@hythe.example', 'device-contractor')
    const started = await start({ roundId, editionId, scenario: { name: 'As it is' } })
    expect(started.status).toBe(202)
    const { body } = await app.http.get(`/api/v1/runs/${started.body.runId as string}`).set('Authorization', planner)
    run = body
  })
  afterAll(() => app.close())

  it('computes stock and a hundred years ahead of the checked sheets', () => {
    expect(run.failure).toBeNull()
    expect(run.state).toBe('done')
    const { stock, yearsAhead, basis } = run.result
    expect(yearsAhead.years).toHaveLength(100)
    expect(yearsAhead.years[0]).toBe(2027)
    expect(stock.total.p10Kg).toBeLessThan(stock.total.p50Kg)
    expect(stock.total.meanKg / basis.computedFloorAreaM2).toBeGreaterThan(700)
    expect(stock.total.meanKg / basis.computedFloorAreaM2).toBeLessThan(2_200)
    expect(
      basis.computedCount +
        basis.inaccessibleCount +
        basis.clearedCount +
        basis.notABuildingCount +
        basis.outstandingCount,
    ).toBe(basis.frameCount)
  })

  it('never lets more come down than stands, and the last cumulative year is all years added up', () => {
    const { stock, yearsAhead } = run.result
    const sum = yearsAhead.demolition.total.meanKg.reduce((total, mass) => total + mass, 0)
    expect(sum).toBeLessThan(stock.total.meanKg)
    expect(Math.abs(sum - yearsAhead.cumulative.meanKg.at(-1)!)).toBeLessThan(1e-9 * sum)
  })

  it('gives equal bytes for equal inputs', async () => {
    const again = await start({ roundId, editionId, scenario: { name: 'As it is' } })
    const { body } = await app.http.get(`/api/v1/runs/${again.body.runId as string}`).set('Authorization', planner)
    expect(body.inputsSha256).toBe(run.inputsSha256)
    expect(body.resultSha256).toBe(run.resultSha256)
  })

  it('lists each building with its mass, which add up to the total', async () => {
    const { body } = await app.http.get(`/api/v1/runs/${run.runId}/buildings`).set('Authorization', planner)
    const total = (body.buildings as { massKg: number }[]).reduce((sum, { massKg }) => sum + massKg, 0)
    expect(Math.abs(total - run.result.stock.total.meanKg)).toBeLessThan(1e-9 * total)
  })

  it('tallies the parts of a building by their own structure, and the buildings still add up to the total', async () => {
    const part = { name: 'hall', footprintM2: 1, aboveGround: 1, use: 'hotel', structure: 'earth' }
    const parts = { parts: [{ ...part, constructionYear: { kind: 'exact', year: 2001, knownBy: 'told' } }] }
    await app.owner.run(
      `UPDATE sheet SET answers = answers || $parts::jsonb WHERE sheet_id =
         (SELECT sheet_id FROM sheet WHERE round_id = $roundId AND state = 'checked' AND finding = 'standing'
            AND footprint_m2 > 50 ORDER BY sheet_id LIMIT 1)`,
      { parts: JSON.stringify({ parts }), roundId },
    )
    const started = await start({ roundId, editionId, scenario: { name: 'With a hall' } })
    const path = `/api/v1/runs/${started.body.runId as string}`
    const { body } = await app.http.get(path).set('Authorization', planner)
    const { body: list } = await app.http.get(`${path}/buildings`).set('Authorization', planner)
    const { cells, total } = (body as { result: RunResult }).result.stock

    expect(cells.filter(({ use, structure }) => use === 'hotel' && structure === 'earth')).toMatchObject([
      { period: '1991-2005', buildingCount: 0, floorAreaM2: 1 },
    ])
    expect(cells.reduce((sum, { buildingCount }) => sum + buildingCount, 0)).toBe(run.result.basis.computedCount)
    const massKg = (list.buildings as { massKg: number }[]).reduce((sum, building) => sum + building.massKg, 0)
    expect(Math.abs(massKg - total.meanKg)).toBeLessThan(1e-9 * massKg)
  })

  it('refuses a round without checked sheets, in words', async () => {
    const empty = await start({ roundId: demoId('nowhere'), editionId, scenario: { name: 'x' } })
    expect(empty.status).toBe(404)
  })

  it('shows a contractor only what was published to them, and nothing after it was withdrawn', async () => {
    const before = await app.http.get('/api/v1/yard/publications').set('Authorization', contractor)
    expect(before.body.publications.map(({ title }: { title: string }) => title)).toEqual(['Kiln Quarter, years ahead'])
    const published = await app.http
      .post('/api/v1/publications')
      .set('Authorization', planner)
      .send({ runId: run.runId, title: 'Kiln Quarter, loads', recipientIds: [demoId('person', 'contractor')] })
    expect(published.status).toBe(201)
    const address = `/api/v1/yard/publications/${published.body.publicationId as string}/loads`
    const { body } = await app.http
      .get(address)
      .query({ containerM3: 20, payloadT: 12 })
      .set('Authorization', contractor)
    const loads = body as LoadsAhead
    const concrete = loads.lines.find(({ code, year }) => code === '17 01 01' && year === 2027)!
    expect(concrete.loads.likely).toBe(
      Math.ceil(Math.max(concrete.massKg.likely / 12_000, concrete.looseVolumeM3.likely / 20)),
    )
    const mass = loads.lines.filter(({ year }) => year === 2027).reduce((sum, line) => sum + line.massKg.likely, 0)
    const { demolition, refurbishment } = run.result.yearsAhead
    const expected = demolition.total.meanKg[0]! + refurbishment.total.meanKg[0]!
    expect(Math.abs(mass - expected)).toBeLessThan(1e-6 * expected)

    const other = await app.http
      .get(address)
      .set('Authorization', await signInAt('contractor2@hythe.example', 'device-contractor-2'))
    expect(other.status).toBe(404)
    const runs = await app.http.get('/api/v1/runs').set('Authorization', contractor)
    expect(runs.status).toBe(403)

    await app.http
      .post(`/api/v1/publications/${published.body.publicationId as string}/withdraw`)
      .set('Authorization', planner)
      .send({ reason: 'A beat is recorded anew.' })
    const after = await app.http.get(address).set('Authorization', contractor)
    expect(after.status).toBe(410)
    expect(after.body.detail).toContain('A beat is recorded anew.')
  })

  it('shows the factor book with a source on every row', async () => {
    const { body } = await app.http.get(`/api/v1/factor-book/editions/${editionId}`).set('Authorization', planner)
    expect(body.rows.intensities.length).toBeGreaterThan(300)
    expect(body.rows.intensities.every((row: { source: string }) => row.source.length > 10)).toBe(true)
  })
})
