import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { editionForDevice } from '@/shared/schemas/factorBook'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { testTown, type TestTown } from '@/tests/sync/testTown'

let testApp: TestApp
let town: TestTown
beforeAll(async () => {
  testApp = await createTestApp()
  town = await testTown(testApp)
})
afterAll(() => testApp.close())

const suspicion = (element: string) => ({
  rowId: randomUUID(),
  substance: 'asbestos',
  component: 'roof',
  element,
  fromYear: 1950,
  toYear: 1990,
  suspicion: 'corrugated sheets',
  caution: 'Only a licensed specialist can tell.',
  source: 'a source',
  provenance: 'published',
  note: null,
})

async function makeEdition(number: number, isIssued: boolean): Promise<void> {
  const edition = { organisationId: town.organisationId, editionId: randomUUID(), number }
  await testApp.owner.run(
    `INSERT INTO edition (organisation_id, edition_id, number, name, state)
     VALUES ($organisationId, $editionId, $number, 'Edition', 'draft')`,
    edition,
  )
  const row = suspicion(`element ${number}`)
  await testApp.owner.run(
    `INSERT INTO factor_row (organisation_id, edition_id, row_id, kind, position, content)
     VALUES ($organisationId, $editionId, $rowId, 'suspicion', 1, $content::jsonb)`,
    { ...edition, rowId: row.rowId, content: JSON.stringify(row) },
  )
  if (!isIssued) return
  await testApp.owner.run(
    `UPDATE edition SET state = 'issued', issued_at = now(), issued_by = $planner
     WHERE organisation_id = $organisationId AND edition_id = $editionId`,
    { ...edition, planner: town.planner.personId },
  )
}
const read = () => testApp.http.get('/api/v1/sync/edition').set(town.surveyor.bearer)

it('gives phones the latest issued edition of their own organisation, and says so when there is none', async () => {
  const before = await read()
  await makeEdition(1, true)
  await makeEdition(2, true)
  await makeEdition(3, false)

  const edition = editionForDevice.parse((await read()).body)
  const stranger = await testTown(testApp)
  const elsewhere = await testApp.http.get('/api/v1/sync/edition').set(stranger.surveyor.bearer)

  expect([before.status, before.body.code]).toEqual([404, 'not-found'])
  expect(edition).toMatchObject({
    number: 2,
    issuedByName: 'Pia',
    suspicions: [{ element: 'element 2' }],
    intensities: [],
  })
  expect(elsewhere.status).toBe(404)
})
