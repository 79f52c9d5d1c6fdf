import { randomUUID } from 'node:crypto'
import { readFileSync } from 'node:fs'
import { strToU8, zipSync } from 'fflate'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { stagedImport } from '@/shared/api/outlines'
import { attributeMapping, outlineCollection } from '@/shared/schemas/outline'
import { buildOrganisation } from '@/tests/support/buildOrganisation'
import { buildPerson } from '@/tests/support/buildPerson'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { signInAs, type SignedInPerson } from '@/tests/support/signInAs'

const REAL = readFileSync('tests/fixtures/outlines-real.geojson', 'utf8')
const NO_MAPPING = attributeMapping.parse({
  reference: null,
  street: null,
  houseNumber: null,
  year: null,
  storeys: null,
  heightM: null,
  use: null,
})
const SIDE = 0.0001

let testApp: TestApp
let planner: SignedInPerson
let stranger: SignedInPerson
beforeAll(async () => {
  testApp = await createTestApp()
  planner = await newPlanner()
  stranger = await newPlanner()
})
afterAll(() => testApp.close())

async function newPlanner() {
  const { organisationId } = await buildOrganisation(testApp)
  return signInAs(testApp, await buildPerson(testApp, { organisationId, roles: ['planner'] }))
}

const square = (west: number, south: number) => [
  [west, south],
  [west + SIDE, south],
  [west + SIDE, south + SIDE],
  [west, south + SIDE],
  [west, south],
]
const feature = (geometry: unknown, properties: object = {}) => ({ type: 'Feature', geometry, properties })
const polygon = (ring: unknown) => ({ type: 'Polygon', coordinates: [ring] })
const fileOf = (...features: unknown[]) => JSON.stringify({ type: 'FeatureCollection', features })

const upload = (person: SignedInPerson, content: string | Uint8Array, name = 'outlines.geojson') =>
  testApp.http.post('/api/v1/outline-imports').set(person.bearer).attach('file', Buffer.from(content), name)
const confirm = (person: SignedInPerson, importId: string, body: object) =>
  testApp.http.post(`/api/v1/outline-imports/${importId}/confirm`).set(person.bearer).send(body)
const get = (person: SignedInPerson, path: string) => testApp.http.get(`/api/v1${path}`).set(person.bearer)

describe('the real file of 160 outlines', () => {
  it('is looked at, imported under the offered mapping, and drawn', async () => {
    const person = await newPlanner()
    const staged = stagedImport.parse((await upload(person, REAL)).body)
    expect(staged).toMatchObject({ featureCount: 160, usableCount: 160, faults: [], fileName: 'outlines.geojson' })
    expect(staged.guess).toEqual({ ...NO_MAPPING, reference: 'identificatiebagpnd', heightM: 'measuredHeight' })
    expect(staged.attributes.find(({ name }) => name === 'creationdate')).toEqual({
      name: 'creationdate',
      filledCount: 160,
      samples: ['2014-07-09'],
    })
    const preview = await get(person, `/outline-imports/${staged.importId}/preview`)
    expect(preview.body.features).toHaveLength(160)

    const report = await confirm(person, staged.importId, { mapping: staged.guess, district: { name: 'Lock Side' } })

    expect(report.status).toBe(200)
    expect(report.body).toMatchObject({ importedCount: 160, leftOutCount: 0, unreadableValues: {} })
    const { features } = outlineCollection.parse(
      (await get(person, `/districts/${report.body.districtId}/outlines`)).body,
    )
    expect(features).toHaveLength(160)
    expect(features[0]?.properties).toMatchObject({ street: null, register: { year: null, storeys: null, use: null } })
    expect(
      features.every(({ properties }) => properties.blockId !== null && properties.register.heightM !== null),
    ).toBe(true)
    const [district] = (await get(person, '/districts')).body.districts
    expect(district).toMatchObject({ name: 'Lock Side', outlineCount: 160, blockCount: report.body.blockCount })
    expect(district.footprintM2).toBeCloseTo(8658.408, 2)
    const blocks = (await get(person, `/districts/${report.body.districtId}/blocks`)).body.features
    expect(
      blocks.reduce(
        (sum: number, block: { properties: { outlineCount: number } }) => sum + block.properties.outlineCount,
        0,
      ),
    ).toBe(160)
    expect(blocks.length).toBeGreaterThan(2)
    expect(blocks.length).toBeLessThan(60)
  })

  it('measures footprints as the database measures them on the spheroid', async () => {
    const [worst] = await testApp.owner.rows<{ difference: number }>(
      'SELECT max(abs(footprint_m2 / ST_Area(geometry::geography) - 1)) AS difference FROM outline',
    )
    expect(worst?.difference).toBeLessThan(1e-5)
  })

  it('comes zipped, and a second time leaves out what is there', async () => {
    const person = await newPlanner()
    const zip = zipSync({ 'readme.txt': strToU8('x'), 'folder/outlines.geojson': strToU8(`\uFEFF${REAL}`) })
    const first = (await upload(person, zip, 'outlines.zip')).body
    const { districtId } = (await confirm(person, first.importId, { mapping: first.guess, district: { name: 'A' } }))
      .body
    const again = (await upload(person, REAL)).body

    const answer = await confirm(person, again.importId, { mapping: again.guess, district: { districtId } })

    expect([answer.status, answer.body.code]).toEqual([422, 'nothing-to-import'])
    expect(
      (await confirm(person, again.importId, { mapping: NO_MAPPING, district: { name: 'B' } })).body.importedCount,
    ).toBe(160)
  })
})

describe('faults of features', () => {
  it('are told one by one with their position, and only the whole ones go in', async () => {
    const bow = [
      [16, 48],
      [16.0001, 48.0001],
      [16.0001, 48],
      [16, 48.0001],
      [16, 48],
    ]
    const content = fileOf(
      feature(polygon(square(16, 48)), { ref: 'A' }),
      feature(null, { ref: 'B' }),
      feature({ type: 'Point', coordinates: [16, 48] }, { ref: 'C' }),
      feature(
        polygon([
          [16, 48],
          [16.1, 48],
          [16, 48],
        ]),
        { ref: 'D' },
      ),
      feature(polygon(square(16.001, 48).slice(0, 4)), { ref: 'E' }),
      feature(polygon(bow), { ref: 'F' }),
      feature(polygon([...square(16, 48).slice(2), ...square(16, 48).slice(1, 3)]), { ref: 'G' }),
      feature(polygon(square(16.002, 48).map(([x, y]) => [y, x])), { ref: 'H' }),
      feature(
        polygon([
          [84500, 447100],
          [84510, 447100],
          [84510, 447110],
          [84500, 447100],
        ]),
        { ref: 'I' },
      ),
      feature(
        polygon([
          [200, 95],
          [201, 95],
          [201, 96],
          [200, 95],
        ]),
        { ref: 'J' },
      ),
      feature(
        polygon([
          [16, 48],
          [16.0001, 48],
          [16.0002, 48],
          [16, 48],
        ]),
        { ref: 'K' },
      ),
      feature({ type: 'MultiPolygon', coordinates: [[square(16.003, 48)], [square(16.004, 48)]] }, { ref: 'L' }),
      'no feature',
      feature(
        polygon([
          ['a', 'b'],
          ['c', 'd'],
        ]),
        { ref: 'N' },
      ),
    )

    const staged = stagedImport.parse((await upload(planner, content)).body)

    expect(staged.faults.map(({ index, reference, code, isMended }) => [index, reference, code, isMended])).toEqual([
      [1, 'B', 'no-geometry', false],
      [2, 'C', 'not-a-polygon', false],
      [3, 'D', 'too-few-positions', false],
      [4, 'E', 'not-closed', true],
      [5, 'F', 'self-crossing', false],
      [6, 'G', 'duplicate', false],
      [7, 'H', 'coordinates-swapped', false],
      [8, 'I', 'coordinates-projected', false],
      [9, 'J', 'coordinates-out-of-range', false],
      [10, 'K', expect.stringMatching(/self-crossing|no-area/), false],
      [12, null, 'no-geometry', false],
      [13, 'N', 'coordinates-out-of-range', false],
    ])
    expect([staged.featureCount, staged.usableCount]).toEqual([14, 3])
    const report = await confirm(planner, staged.importId, { mapping: staged.guess, district: { name: 'Faults' } })
    expect(report.body).toMatchObject({ importedCount: 3, leftOutCount: 11 })
  })

  it('of a file with all coordinates swapped are seen once the organisation has outlines', async () => {
    const person = await newPlanner()
    const turned = fileOf(feature(polygon(square(16.3, 48.2).map(([x, y]) => [y, x]))))
    expect((await upload(person, turned)).body.faults).toEqual([])
    const known = (await upload(person, fileOf(feature(polygon(square(16.3, 48.2)))))).body
    await confirm(person, known.importId, { mapping: NO_MAPPING, district: { name: 'Known' } })

    expect((await upload(person, turned)).body.faults).toMatchObject([{ index: 0, code: 'coordinates-swapped' }])
  })
})

describe('register attributes', () => {
  it('are guessed by name and value, read in their many spellings, and counted where they cannot be used', async () => {
    const rows = [
      {
        Bouwjaar: 1932,
        AantalVerdiepingen: '2,5',
        Hoogte: '8.4 m',
        Gebruiksdoel: 'woonfunctie',
        straat: ' Ferry Lane ',
        Huisnummer: 12,
        Id: 'x-1',
      },
      {
        Bouwjaar: '1978-01-01',
        AantalVerdiepingen: 4,
        Hoogte: 12,
        Gebruiksdoel: 'kantoorfunctie',
        straat: 'Ferry Lane',
        Huisnummer: '14a',
        Id: 'x-2',
      },
      {
        Bouwjaar: 'unknown',
        AantalVerdiepingen: 0,
        Hoogte: 0,
        Gebruiksdoel: 'gibberish',
        straat: null,
        Huisnummer: '',
        Id: 'x-2',
      },
    ]
    const content = fileOf(...rows.map((row, index) => feature(polygon(square(16 + index / 100, 48)), row)))
    const staged = (await upload(planner, content)).body
    const mapping = {
      reference: 'Id',
      street: 'straat',
      houseNumber: 'Huisnummer',
      year: 'Bouwjaar',
      storeys: 'AantalVerdiepingen',
      heightM: 'Hoogte',
      use: 'Gebruiksdoel',
    }
    expect(staged.guess).toEqual({ ...mapping, reference: null })

    const report = await confirm(planner, staged.importId, { mapping, district: { name: 'Register' } })

    expect(report.body.unreadableValues).toEqual({ year: 1, storeys: 1, heightM: 1, use: 1 })
    const { features } = (await get(planner, `/districts/${report.body.districtId}/outlines`)).body
    const rowsRead = features.map(({ properties }: { properties: Record<string, unknown> }) => [
      properties.reference,
      properties.street,
      properties.houseNumber,
      properties.register,
    ])
    expect(rowsRead).toEqual([
      ['x-1', 'Ferry Lane', '12', { year: 1932, storeys: 2.5, heightM: 8.4, use: 'multi-family' }],
      ['x-2', 'Ferry Lane', '14a', { year: 1978, storeys: 4, heightM: 12, use: 'office' }],
      ['x-2 (2)', null, null, { year: null, storeys: null, heightM: null, use: null }],
    ])
  })

  it('give way to made-up references, numbered on from those that are there', async () => {
    const one = (await upload(planner, fileOf(feature(polygon(square(17, 48)))))).body
    const { districtId } = (
      await confirm(planner, one.importId, { mapping: NO_MAPPING, district: { name: 'Made up' } })
    ).body
    const two = (
      await upload(
        planner,
        fileOf(feature(polygon(square(17.01, 48)), { a: 'R-0007' }), feature(polygon(square(17.02, 48)))),
      )
    ).body
    await confirm(planner, two.importId, { mapping: { ...NO_MAPPING, reference: 'a' }, district: { districtId } })

    const { features } = (await get(planner, `/districts/${districtId}/outlines`)).body
    expect(features.map(({ properties }: { properties: { reference: string } }) => properties.reference)).toEqual([
      'R-0001',
      'R-0007',
      'R-0008',
    ])
  })

  it('cannot reach behind the objects they are read into', async () => {
    const content = `{"type":"FeatureCollection","features":[{"type":"Feature","properties":{"__proto__":{"x":1},"constructor":"y","a\\u0000b":"c\\u0000d"},"geometry":${JSON.stringify(polygon(square(18, 48)))}}]}`
    const staged = await upload(planner, content)

    expect(staged.status).toBe(201)
    expect(staged.body.attributes).toEqual([{ name: 'ab', filledCount: 1, samples: ['cd'] }])
  })
})

describe('a file that cannot be read', () => {
  const zipOf = (files: Record<string, Uint8Array>) => zipSync(files)
  it.each<[string, string | Uint8Array, string, number, string]>([
    ['text of another kind', 'hello', 'a.geojson', 422, 'file-not-geojson'],
    ['JSON of another kind', '{"type":"Topology"}', 'a.json', 422, 'file-not-geojson'],
    ['no features', fileOf(), 'a.geojson', 422, 'file-empty'],
    ['bytes that are no text', new Uint8Array([0x7b, 0xff, 0xfe]), 'a.geojson', 422, 'file-not-text'],
    ['another ending', fileOf(), 'a.shp', 415, 'file-kind-not-known'],
    ['a zip of nothing of ours', zipOf({ 'a.txt': strToU8('x') }), 'a.zip', 422, 'zip-without-outlines'],
    ['a zip of two', zipOf({ 'a.json': strToU8('{}'), 'b.json': strToU8('{}') }), 'a.zip', 422, 'zip-without-outlines'],
    ['a broken zip', zipOf({ 'a.json': strToU8(REAL) }).subarray(0, 4_000), 'a.zip', 422, 'zip-not-readable'],
    [
      'a zip that unpacks to more than 100 MB',
      zipOf({ 'a.json': new Uint8Array(101_000_000) }),
      'a.zip',
      413,
      'file-too-large',
    ],
    ['more than 50,000 features', fileOf(...Array(50_001).fill(0)), 'a.geojson', 413, 'too-many-features'],
  ])('is refused: %s', async (_title, content, name, status, code) => {
    const answer = await upload(planner, content, name)
    expect([answer.status, answer.body.code]).toEqual([status, code])
  })

  it('is refused without a file, or in another part', async () => {
    const bare = await testApp.http.post('/api/v1/outline-imports').set(planner.bearer).send({})
    const other = await testApp.http
      .post('/api/v1/outline-imports')
      .set(planner.bearer)
      .attach('other', Buffer.from('x'), 'a.json')

    expect([bare.status, bare.body.faults[0].code]).toEqual([422, 'file-missing'])
    expect([other.status, other.body.faults[0].code]).toEqual([422, 'file-missing'])
  })
})

describe('a waiting file', () => {
  const waiting = async (person: SignedInPerson) =>
    (await upload(person, fileOf(feature(polygon(square(19, 48)))))).body.importId as string

  it('is imported once, and not after it was thrown away', async () => {
    const importId = await waiting(planner)
    const orders = [0, 1].map((number) =>
      confirm(planner, importId, { mapping: NO_MAPPING, district: { name: `Once ${number}` } }),
    )
    const statuses = (await Promise.all(orders)).map(({ status }) => status).sort()
    const thrown = await waiting(planner)
    const discarded = await testApp.http.delete(`/api/v1/outline-imports/${thrown}`).set(planner.bearer)

    expect(statuses).toEqual([200, 409])
    expect(discarded.status).toBe(200)
    expect((await get(planner, `/outline-imports/${thrown}/preview`)).body.code).toBe('import-settled')
    const [kept] = await testApp.owner.rows(
      'SELECT count(*)::int AS n FROM outline_import WHERE state <> $s AND features IS NOT NULL',
      { s: 'staged' },
    )
    expect(kept).toEqual({ n: 0 })
  })

  it('leaves nothing behind when the import fails half way', async () => {
    const importId = await waiting(planner)
    await testApp.owner.run(`ALTER TABLE block ADD CONSTRAINT planted CHECK (name = 'x') NOT VALID`)
    const failed = await confirm(planner, importId, { mapping: NO_MAPPING, district: { name: 'Half way' } })
    await testApp.owner.run('ALTER TABLE block DROP CONSTRAINT planted')

    expect([failed.status, failed.body.code]).toEqual([500, 'fault-of-ours'])
    expect(JSON.stringify(failed.body)).not.toMatch(/planted|INSERT|block/)
    expect(JSON.stringify(testApp.context.logged)).not.toContain('Half way')
    expect((await get(planner, '/districts')).body.districts.map(({ name }: { name: string }) => name)).not.toContain(
      'Half way',
    )
    expect((await confirm(planner, importId, { mapping: NO_MAPPING, district: { name: 'Half way' } })).status).toBe(200)
  })

  it('is nobody else’s, and unknown ones are unknown', async () => {
    const importId = await waiting(planner)
    const body = { mapping: NO_MAPPING, district: { name: 'Mine' } }
    for (const [person, wanted] of [
      [stranger, importId],
      [planner, randomUUID()],
    ] as const) {
      expect((await get(person, `/outline-imports/${wanted}/preview`)).status).toBe(404)
      expect((await confirm(person, wanted, body)).status).toBe(404)
      expect((await testApp.http.delete(`/api/v1/outline-imports/${wanted}`).set(person.bearer)).status).toBe(404)
    }
  })

  it('makes room: five wait at most', async () => {
    const person = await newPlanner()
    const ids = []
    for (let number = 0; number < 6; number += 1) {
      testApp.context.clock.advanceMs(1_000)
      ids.push(await waiting(person))
    }
    expect((await get(person, `/outline-imports/${ids[0]}/preview`)).status).toBe(404)
    expect((await get(person, `/outline-imports/${ids[1]}/preview`)).status).toBe(200)
  })
})

describe('districts', () => {
  it('are drawn around outlines, which they take with new blocks', async () => {
    const person = await newPlanner()
    const grid = Array.from({ length: 8 }, (_, index) => feature(polygon(square(20 + index * 0.001, 48))))
    const staged = (await upload(person, fileOf(...grid))).body
    const old = (await confirm(person, staged.importId, { mapping: NO_MAPPING, district: { name: 'Old' } })).body
    const around = (west: number, east: number) =>
      polygon([
        [west, 47.9],
        [east, 47.9],
        [east, 48.1],
        [west, 48.1],
        [west, 47.9],
      ])
    const draw = (body: object) => testApp.http.post('/api/v1/districts').set(person.bearer).send(body)

    const drawn = await draw({ name: 'New', geometry: around(19.9995, 20.0028) })

    expect(drawn.status).toBe(201)
    expect(drawn.body).toMatchObject({ name: 'New', outlineCount: 3, blockCount: 3 })
    expect((await get(person, `/districts/${old.districtId}/blocks`)).body.features).toHaveLength(5)
    expect((await draw({ name: 'new', geometry: around(20.003, 20.005) })).body.code).toBe('district-name-taken')
    expect((await draw({ name: 'Empty', geometry: around(30, 31) })).body.code).toBe('district-without-outlines')
    expect(
      (
        await draw({
          name: 'Bow',
          geometry: polygon([
            [20, 48],
            [21, 49],
            [21, 48],
            [20, 49],
            [20, 48],
          ]),
        })
      ).body.faults[0].code,
    ).toBe('self-crossing')
  })

  it('belong to one organisation and to the right roles', async () => {
    const districtId = (await get(planner, '/districts')).body.districts[0].districtId as string
    const surveyor = await signInAs(testApp, await buildPerson(testApp, { organisationId: planner.organisationId }))
    for (const part of ['outlines', 'blocks']) {
      expect((await get(stranger, `/districts/${districtId}/${part}`)).status).toBe(404)
      expect((await get(planner, `/districts/${randomUUID()}/${part}`)).status).toBe(404)
      expect((await get(planner, `/districts/x/${part}`)).status).toBe(422)
      expect((await get(surveyor, `/districts/${districtId}/${part}`)).status).toBe(403)
    }
    const staged = (await upload(stranger, fileOf(feature(polygon(square(16, 48)))))).body
    expect((await confirm(stranger, staged.importId, { mapping: NO_MAPPING, district: { districtId } })).status).toBe(
      404,
    )
    expect((await upload(surveyor, REAL)).status).toBe(403)
  })
})
