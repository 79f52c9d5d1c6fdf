import { afterAll, beforeAll, expect, it } from 'vitest'
import { buildPerson } from '@/tests/support/buildPerson'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { signInAs } from '@/tests/support/signInAs'

const COUNT = 50_000
const COLUMNS = 250
const BLOCK = 10
/** Buildings 9 m × 12 m with 4 m between them, streets of 14 m after every ten. */
const STEP_DEG = { east: 0.000_175, north: 0.000_145 }
const STREET_DEG = 0.000_19

let testApp: TestApp
beforeAll(async () => {
  testApp = await createTestApp()
})
afterAll(() => testApp.close())

function gridTown(): string {
  const features = Array.from({ length: COUNT }, (_, index) => {
    const column = index % COLUMNS
    const row = Math.floor(index / COLUMNS)
    const west = 10 + column * STEP_DEG.east + Math.floor(column / BLOCK) * STREET_DEG
    const south = 50 + row * STEP_DEG.north + Math.floor(row / BLOCK) * STREET_DEG
    const [east, north] = [west + 0.000_12, south + 0.000_11]
    const ring = [
      [west, south],
      [east, south],
      [east, north],
      [west, north],
      [west, south],
    ]
    return {
      type: 'Feature',
      geometry: { type: 'Polygon', coordinates: [ring] },
      properties: { ref: `B${index}`, built: 1850 + (index % 170), levels: 1 + (index % 5), street: `Lane ${row}` },
    }
  })
  return JSON.stringify({ type: 'FeatureCollection', features })
}

it('takes the 50,000 outlines it promises, whole, with blocks that can be walked', async () => {
  const planner = await signInAs(testApp, await buildPerson(testApp, { roles: ['planner'] }))
  const staged = await testApp.http
    .post('/api/v1/outline-imports')
    .set(planner.bearer)
    .attach('file', Buffer.from(gridTown()), 'town.geojson')
  expect(staged.body).toMatchObject({ featureCount: COUNT, usableCount: COUNT, faults: [] })

  const report = await testApp.http
    .post(`/api/v1/outline-imports/${staged.body.importId}/confirm`)
    .set(planner.bearer)
    .send({ mapping: staged.body.guess, district: { name: 'Large' } })

  expect(report.body).toMatchObject({ importedCount: COUNT, leftOutCount: 0, blockCount: 1_500, unreadableValues: {} })
  const [largest] = await testApp.owner.rows(
    'SELECT max(n)::integer AS n, sum(n)::integer AS total FROM (SELECT count(*) AS n FROM outline GROUP BY block_id) AS blocks',
  )
  expect(largest).toEqual({ n: expect.any(Number), total: COUNT })
  expect((largest as { n: number }).n).toBeLessThanOrEqual(60)
}, 240_000)
