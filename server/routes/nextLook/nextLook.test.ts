import { mkdtemp } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { demoId } from '@/server/demo/seeding.types'
import { seedDemo } from '@/server/demo/seedDemo'
import { DEMO_PASSWORD } from '@/server/demo/townNames'
import type { NextLooksReply } from '@/shared/api/nextLook'
import type { DeviceLooks } from '@/shared/schemas/nextLook'
import { buildPerson } from '@/tests/support/buildPerson'
import { buildRound } from '@/tests/support/buildRound'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { signInAs } from '@/tests/support/signInAs'

describe('where to look next', () => {
  let app: TestApp
  let planner: string
  let surveyor: string
  let beat: { beat_id: string; round_id: string; email: string }
  let looks: NextLooksReply

  const signInAt = async (email: string) => {
    const device = { deviceId: demoId(`device-of-${email}`), name: 'test' }
    const { body } = await app.http.post('/api/v1/auth/sign-in').send({ email, password: DEMO_PASSWORD, device })
    return `Bearer ${body.accessToken as string}`
  }
  const get = (address: string, bearer: string, query: object = {}) =>
    app.http.get(`/api/v1${address}`).query(query).set('Authorization', bearer)
  const choose = (bearer: string, figure: object) =>
    app.http.put(`/api/v1/rounds/${beat.round_id}/look-figure`).set('Authorization', bearer).send(figure)

  beforeAll(async () => {
    app = await createTestApp()
    await seedDemo(app.ownerUrl, await mkdtemp(path.join(tmpdir(), 'tally-photos-')))
    const [found] = await app.owner.rows<typeof beat>(
      `SELECT b.beat_id, b.round_id, p.email FROM beat b
       JOIN person p ON p.organisation_id = b.organisation_id AND p.person_id = b.surveyor_id
       JOIN round_building x ON x.organisation_id = b.organisation_id AND x.beat_id = b.beat_id
       LEFT JOIN sheet s ON s.organisation_id = x.organisation_id AND s.sheet_id = x.building_id
       WHERE s.sheet_id IS NULL AND b.deleted_at IS NULL
       GROUP BY 1, 2, 3 ORDER BY count(*) DESC LIMIT 1`,
    )
    beat = found!
    planner = await signInAt('planner@hythe.example')
    surveyor = await signInAt(beat.email)
    const edition = demoId('edition', 1)
    await app.http
      .post('/api/v1/runs')
      .set('Authorization', planner)
      .send({ roundId: beat.round_id, editionId: edition, scenario: { name: 'As it is' } })
    const { body, status } = await get(`/rounds/${beat.round_id}/next-look`, planner)
    expect([status, body.detail]).toEqual([200, undefined])
    looks = body
  })
  afterAll(() => app.close())

  it('ranks the frame by falling shares of the variance, unrecorded and doubtful buildings alike', () => {
    expect(looks.looks.length).toBeGreaterThan(20)
    const falls = looks.looks.map(({ fallKg2 }) => fallKg2)
    expect(falls).toEqual([...falls].sort((a, b) => b - a))
    expect(falls.reduce((sum, fall) => sum + fall, 0)).toBeLessThan(looks.varianceKg2)
    expect(looks.run.isOfRound).toBe(true)
    expect(looks.looks.some(({ state }) => state === 'to-do')).toBe(true)
    const { measurement, factor } = looks.varianceShares
    expect(measurement + factor).toBeCloseTo(1, 9)
  })

  it('answers for the figure asked for, and each has an order of its own', async () => {
    const { body } = await get(`/rounds/${beat.round_id}/next-look`, planner, { material: 'timber', byYear: 2040 })

    expect(body.figure).toEqual({ material: 'timber', byYear: 2040 })
    expect(body.meanKg).toBeLessThan(looks.meanKg)
    expect(body.varianceShares.lifetime).toBeGreaterThan(0)
    const order = ({ looks: list }: NextLooksReply) => list.map(({ buildingId }) => buildingId)
    expect(order(body)).not.toEqual(order(looks))
  })

  it('refuses a year that is not ahead, in words', async () => {
    const { status, body } = await get(`/rounds/${beat.round_id}/next-look`, planner, { material: 'all', byYear: 1990 })

    expect(status).toBe(422)
    expect(body.faults[0].code).toBe('year-not-ahead')
  })

  it('tells a phone its own part of the list, for the figure the planner chose', async () => {
    const figure = { material: 'steel', byYear: null }
    expect((await choose(planner, figure)).body).toEqual(figure)

    const { body } = await get('/sync/next-look', surveyor)
    const mine = (body.rounds as DeviceLooks[]).find(({ roundId }) => roundId === beat.round_id)!

    expect(mine.figure).toEqual(figure)
    expect(mine.looks.length).toBeGreaterThan(0)
    expect(mine.looks.length).toBeLessThanOrEqual(mine.roundCount)
    const owned = await app.owner.rows<{ building_id: string }>(
      `SELECT building_id FROM round_building b JOIN beat t USING (organisation_id, beat_id)
       JOIN person p ON p.organisation_id = t.organisation_id AND p.person_id = t.surveyor_id WHERE p.email = $email`,
      { email: beat.email },
    )
    const own = new Set(owned.map(({ building_id }) => building_id))
    expect(mine.looks.every(({ buildingId }) => own.has(buildingId))).toBe(true)
    const ranks = mine.looks.map(({ rank }) => rank)
    expect(ranks).toEqual([...ranks].sort((a, b) => a - b))
  })

  it('takes a building from the list once it is recorded and sure', async () => {
    const [first] = looks.looks
    await app.owner.run(
      `INSERT INTO sheet (organisation_id, sheet_id, round_id, state, recorded_by, change_no, finding, use, structure, year_from,
                          year_to, footprint_m2, gross_floor_area_m2, floor_area_cv)
       SELECT b.organisation_id, b.building_id, b.round_id, 'handed-in', r.created_by, 1, 'standing', 'office', 'steel-frame', 1990,
              1990, 100, 300, 0.02 FROM round_building b JOIN round r USING (organisation_id, round_id) WHERE b.building_id = $buildingId
       ON CONFLICT (organisation_id, sheet_id) DO UPDATE SET finding = 'standing', use = 'office', structure = 'steel-frame',
         year_from = 1990, year_to = 1990, gross_floor_area_m2 = 300, floor_area_cv = 0.02`,
      { buildingId: first!.buildingId },
    )
    const { body } = await get(`/rounds/${beat.round_id}/next-look`, planner, { material: 'all' })

    expect((body as NextLooksReply).looks.some(({ buildingId }) => buildingId === first!.buildingId)).toBe(false)
    expect((body as NextLooksReply).varianceKg2).not.toBe(looks.varianceKg2)
  })

  it('keeps a round, its list and its figure to its own organisation', async () => {
    const stranger = (await signInAs(app, await buildPerson(app, { roles: ['planner', 'surveyor'] }))).bearer
      .Authorization!

    expect((await get(`/rounds/${beat.round_id}/next-look`, stranger)).status).toBe(404)
    expect((await choose(stranger, { material: 'all', byYear: null })).status).toBe(404)
    expect((await get('/sync/next-look', stranger)).body).toEqual({ rounds: [] })
  })

  it('says that a run is needed first where the district has none', async () => {
    const [owner] = await app.owner.rows<{ organisationId: string; createdBy: string }>(
      `SELECT organisation_id AS "organisationId", created_by AS "createdBy" FROM round WHERE round_id = $roundId`,
      { roundId: beat.round_id },
    )
    const bare = await buildRound(app, owner!)
    const { status, body } = await get(`/rounds/${bare.roundId}/next-look`, planner)
    expect([status, body.code]).toEqual([409, 'no-finished-run'])
  })
})
