import { mkdtemp } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { demoId } from '@/server/demo/seeding.types'
import { seedDemo } from '@/server/demo/seedDemo'
import { DEMO_PASSWORD } from '@/server/demo/townNames'
import { listingPage, type ListingPage } from '@/shared/schemas/listing'
import type { RunBuilding } from '@/shared/schemas/run'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'

describe('a building with a known day of demolition', () => {
  let app: TestApp
  let planner: string
  let mine: string
  let rival: string
  let building: RunBuilding
  let runId: string
  let contractorId: string
  let listed: ListingPage

  const signInAt = async (email: string) => {
    const device = { deviceId: demoId('device', email), name: 'test' }
    const { body } = await app.http.post('/api/v1/auth/sign-in').send({ email, password: DEMO_PASSWORD, device })
    return `Bearer ${body.accessToken as string}`
  }
  const call = (who: string, method: 'get' | 'post' | 'put', route: string, body?: object) =>
    app.http[method](`/api/v1${route}`).set('Authorization', who).send(body)
  const order = (change: object = {}) => ({
    runId,
    buildingId: building.buildingId,
    comesDownOn: '2027-05-03',
    note: 'Rear yard only.',
    recipientIds: [contractorId],
    ...change,
  })

  beforeAll(async () => {
    app = await createTestApp()
    await seedDemo(app.ownerUrl, await mkdtemp(path.join(tmpdir(), 'tally-photos-')))
    planner = await signInAt('planner@hythe.example')
    mine = await signInAt('contractor@hythe.example')
    rival = await signInAt('contractor2@hythe.example')
    const runs = await call(planner, 'get', '/runs')
    runId = runs.body.runs.find(({ state }: { state: string }) => state === 'done').runId
    const map = await call(planner, 'get', `/runs/${runId}/buildings`)
    const before = await call(planner, 'get', '/listings')
    const listedIds = new Set(before.body.listings.map(({ buildingId }: { buildingId: string }) => buildingId))
    building = map.body.buildings.find(
      (one: RunBuilding) =>
        !listedIds.has(one.buildingId) &&
        one.yearFrom !== null &&
        (one.yearTo ?? 3000) < 1980 &&
        one.structure !== 'unknown',
    )
    const people = await call(planner, 'get', '/people?role=contractor')
    contractorId = people.body.people.find(
      ({ email }: { email: string }) => email === 'contractor@hythe.example',
    ).personId
    const answer = await call(planner, 'post', '/listings', order())
    expect(answer.status).toBe(201)
    listed = listingPage.parse(answer.body)
  })
  afterAll(() => app.close())

  it('is listed with an inventory by material and component that adds up to the run', () => {
    const total = listed.inventory.lines.reduce((sum, { massKg }) => sum + massKg.likely, 0)

    expect(total / building.massKg).toBeCloseTo(1, 9)
    expect(listed.inventory.lines.every(({ massKg: { low, likely, high } }) => low < likely && likely < high)).toBe(
      true,
    )
    expect(new Set(listed.inventory.lines.map(({ component }) => component)).size).toBeGreaterThan(3)
  })

  it('says what to have sampled by the age of the building, each with its source', () => {
    expect(listed.inventory.suspicions.length).toBeGreaterThan(0)
    expect(listed.inventory.suspicions.every(({ source }) => source !== '')).toBe(true)
    expect(listed.inventory.lines.some(({ mustAsk }) => mustAsk)).toBe(true)
  })

  it('is seen by those it was listed to, and by no other contractor', async () => {
    const seen = (await call(mine, 'get', '/yard/listings')).body.listings
    expect(seen.map(({ listingId }: { listingId: string }) => listingId)).toContain(listed.listingId)
    expect((await call(rival, 'get', '/yard/listings')).body.listings).toEqual([])
    expect((await call(rival, 'get', `/yard/listings/${listed.listingId}`)).status).toBe(404)
    expect((await call(mine, 'get', `/listings/${listed.listingId}`)).status).toBe(403)
  })

  it('is listed once at a time', async () => {
    const again = await call(planner, 'post', '/listings', order())

    expect([again.status, again.body.code]).toEqual([409, 'already-listed'])
  })

  it('goes to contractors only, and takes a building of the run only', async () => {
    const { body } = await call(planner, 'get', `/runs/${runId}/buildings`)
    const other = body.buildings.at(-1).buildingId
    expect(
      (await call(planner, 'post', '/listings', order({ buildingId: other, recipientIds: [demoId('nobody')] }))).status,
    ).toBe(422)
    expect((await call(planner, 'post', '/listings', order({ buildingId: demoId('nowhere') }))).status).toBe(404)
  })

  it('keeps what its contractor found, for the planner to read', async () => {
    const found = await call(mine, 'post', `/yard/listings/${listed.listingId}/findings`, {
      text: 'Cellar under the yard.',
    })

    expect(found.status).toBe(201)
    const page = listingPage.parse((await call(planner, 'get', `/listings/${listed.listingId}`)).body)
    expect(page.findings.map(({ text, byName }) => [text, byName])).toEqual([
      ['Cellar under the yard.', 'Okes & Daughter Demolition'],
    ])
  })

  it('takes tickets all or none, names each fault by its row, and sets them beside the estimate', async () => {
    const give = (csv: string) => call(mine, 'put', `/yard/listings/${listed.listingId}/tickets`, { csv })
    const good = 'date;waste_code;mass_t\n2027-05-04;17 01 02;12,5\n2027-05-04;170102;7.5\n2027-05-05;17 02 01;3\n'

    expect((await give(good)).status).toBe(200)
    const bad = await give('date,waste_code,mass_t\n2027-05-04,17 01 02,10\nyesterday,17 99 99,-1\n')

    expect(bad.status).toBe(422)
    expect(bad.body.faults.map(({ pointer }: { pointer: string }) => pointer)).toEqual([
      '/body/csv/3/date',
      '/body/csv/3/waste_code',
      '/body/csv/3/mass_t',
    ])
    expect((await give('day,code\n1,2\n')).body.faults[0].code).toBe('column-missing')
    const page = listingPage.parse((await call(planner, 'get', `/listings/${listed.listingId}`)).body)
    const bricks = page.comparison.find(({ code }) => code === '17 01 02')
    expect(bricks).toMatchObject({ weighedKg: 20_000, tickets: 2 })
    expect(page.comparison.filter(({ weighedKg }) => weighedKg !== null)).toHaveLength(2)
  })

  it('is taken back with a reason that its readers see instead of the inventory', async () => {
    const back = await call(planner, 'post', `/listings/${listed.listingId}/withdraw`, {
      reason: 'The permit was refused.',
    })

    expect(back.body.withdrawalReason).toBe('The permit was refused.')
    expect((await call(planner, 'post', `/listings/${listed.listingId}/withdraw`, { reason: 'Again.' })).status).toBe(
      409,
    )
    const read = await call(mine, 'get', `/yard/listings/${listed.listingId}`)
    expect([read.status, read.body.code]).toEqual([410, 'listing-withdrawn'])
    const kept = (await call(mine, 'get', '/yard/listings')).body.listings
    const reasons = kept.map(({ withdrawalReason }: { withdrawalReason: string | null }) => withdrawalReason)
    expect(reasons).toContain('The permit was refused.')
  })
})
