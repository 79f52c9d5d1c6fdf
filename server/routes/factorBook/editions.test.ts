import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { FullEdition } from '@/shared/schemas/factorBook'
import { buildPerson } from '@/tests/support/buildPerson'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { signInAs, type SignedInPerson } from '@/tests/support/signInAs'

let app: TestApp
let planner: SignedInPerson
beforeAll(async () => {
  app = await createTestApp()
  planner = await signInAs(app, await buildPerson(app, { roles: ['planner'], name: 'Pia Rook' }))
})
afterAll(() => app.close())

const BOOK = '/api/v1/factor-book/editions'
const post = (path: string, body: object) => app.http.post(`${BOOK}${path}`).set(planner.bearer).send(body)
const draft = async (from = 'published'): Promise<string> =>
  ((await post('', { name: 'Draft of the autumn', from })).body as { editionId: string }).editionId
const read = async (editionId: string): Promise<FullEdition> =>
  (await app.http.get(`${BOOK}/${editionId}`).set(planner.bearer)).body
const discard = (editionId: string) => app.http.delete(`${BOOK}/${editionId}`).set(planner.bearer)
const change = (editionId: string, part: string, row: object) => {
  const { rowId, ...body } = { rowId: '', ...row }
  return app.http.put(`${BOOK}/${editionId}/${part}/rows/${rowId}`).set(planner.bearer).send(body)
}
const faultsOf = (answer: { body: { faults: { pointer: string; code: string }[] } }) =>
  answer.body.faults.map(({ pointer, code }) => [pointer, code])

describe('editions of the factor book', () => {
  it('begin as a draft of the published figures, are issued with number and note, and never change again', async () => {
    const editionId = await draft()
    const issued = await post(`/${editionId}/issue`, { number: 1, note: 'First edition.' })

    expect(issued.body.faults ?? []).toEqual([])
    expect(issued.body).toMatchObject({ number: 1, state: 'issued', issuedByName: 'Pia Rook', note: 'First edition.' })
    const { rows } = await read(editionId)
    const changed = await change(editionId, 'lifetimes', { ...rows.lifetimes[0]!, meanYears: 50 })
    expect([changed.status, changed.body.code]).toEqual([409, 'edition-issued'])
    expect((await discard(editionId)).status).toBe(409)
    expect((await read(editionId)).rows).toEqual(rows)
  })

  it('are refused a change by the database itself, also by moving a row out of them', async () => {
    const issuedId = await draft()
    expect((await post(`/${issuedId}/issue`, { number: 20, note: 'x' })).status).toBe(200)
    const draftId = await draft(issuedId)
    await app.owner.run('DELETE FROM factor_row WHERE edition_id = $draftId', { draftId })

    for (const sql of [
      `UPDATE edition SET name = 'other' WHERE edition_id = $issuedId`,
      `DELETE FROM factor_row WHERE edition_id = $issuedId`,
      `UPDATE factor_row SET edition_id = '${draftId}' WHERE edition_id = $issuedId`,
    ])
      await expect(app.owner.run(sql, { issuedId })).rejects.toThrow('an issued edition does not change')
  })

  it('copy all rows, take a changed, a new and a removed row, and are deleted as drafts', async () => {
    const editionId = await draft()
    const copyId = await draft(editionId)
    const { rows } = await read(copyId)
    const [life] = rows.lifetimes
    const [first, second] = rows.densities
    expect((await change(copyId, 'lifetimes', { ...life!, meanYears: 99 })).status).toBe(200)
    const { rowId: _, ...asNew } = { ...first!, load: 'crushed tiles, loose' }
    expect((await post(`/${copyId}/densities/rows`, asNew)).status).toBe(201)
    expect((await app.http.delete(`${BOOK}/${copyId}/rows/${second!.rowId}`).set(planner.bearer)).status).toBe(200)

    const after = (await read(copyId)).rows
    expect(after.lifetimes.find(({ rowId }) => rowId === life!.rowId)?.meanYears).toBe(99)
    expect(after.densities).toHaveLength(rows.densities.length)
    expect(after.densities.at(-1)?.load).toBe('crushed tiles, loose')
    expect((await read(editionId)).rows).toEqual(rows)
    expect((await discard(copyId)).status).toBe(200)
    expect((await app.http.get(`${BOOK}/${copyId}`).set(planner.bearer)).status).toBe(404)
  })

  it('keep the error of a figure shared until the figure has another source', async () => {
    const editionId = await draft()
    const [row] = (await read(editionId)).rows.intensities
    await change(editionId, 'intensities', { ...row!, sharedCv: 0.11 })
    const valued = (await read(editionId)).rows.intensities.find(({ rowId }) => rowId === row!.rowId)!
    await change(editionId, 'intensities', { ...row!, source: 'weighed at an invented yard' })
    const resourced = (await read(editionId)).rows.intensities.find(({ rowId }) => rowId === row!.rowId)!

    expect([valued.sharedCv, valued.figureId]).toEqual([0.11, row!.figureId])
    expect(resourced.figureId).not.toBe(row!.figureId)
  })

  it('refuse a row with a sentence at the field, and keep the row as it was', async () => {
    const editionId = await draft()
    const { rows } = await read(editionId)
    const intensity = rows.intensities[0]!
    const life = rows.lifetimes[0]!
    const refused = async (part: string, row: object) => faultsOf(await change(editionId, part, row))

    expect(await refused('intensities', { ...intensity, areaBasis: null })).toEqual([
      ['/body/areaBasis', 'basisMissing'],
    ])
    expect(await refused('intensities', { ...intensity, meanKgPerM2: -1 })).toEqual([['/body/meanKgPerM2', 'negative']])
    expect(await refused('intensities', { ...intensity, meanKgPerM2: 1e6 })).toEqual([
      ['/body/meanKgPerM2', 'tooLarge'],
    ])
    expect(await refused('intensities', { ...intensity, period: '1940-1950' })).toEqual([
      ['/body/period', 'periodOverlaps'],
    ])
    expect(await refused('lifetimes', { ...life, meanYears: 0 })).toEqual([['/body/meanYears', 'zeroLife']])
    expect(faultsOf(await post(`/${editionId}/lifetimes/rows`, life))).toEqual([['/body/use', 'duplicate']])
    expect((await read(editionId)).rows).toEqual(rows)
  })

  it('are not issued under a number that is taken, or without a life for every building', async () => {
    const editionId = await draft()
    const issuedId = await draft()
    expect((await post(`/${issuedId}/issue`, { number: 40, note: 'x' })).status).toBe(200)
    const low = await post(`/${editionId}/issue`, { number: 3, note: 'x' })
    const life = (await read(editionId)).rows.lifetimes.find(
      ({ use, structure, component }) => use === 'all' && structure === 'all' && component === 'building',
    )!
    await app.http.delete(`${BOOK}/${editionId}/rows/${life.rowId}`).set(planner.bearer)
    const lifeless = await post(`/${editionId}/issue`, { number: 41, note: 'x' })

    expect([low.status, faultsOf(low)]).toEqual([422, [['/body/number', 'number-taken']]])
    expect([lifeless.status, lifeless.body.faults[0].code]).toEqual([422, 'noBuildingLife'])
    expect((await read(editionId)).state).toBe('draft')
  })

  it('are not to be touched by another organisation', async () => {
    const editionId = await draft()
    const stranger = await signInAs(app, await buildPerson(app, { roles: ['planner'] }))
    const copied = await app.http.post(BOOK).set(stranger.bearer).send({ name: 'Mine', from: editionId })
    const gone = await app.http.delete(`${BOOK}/${editionId}`).set(stranger.bearer)
    const nowhere = await app.http.delete(`${BOOK}/${editionId}/rows/${randomUUID()}`).set(planner.bearer)

    expect([copied.status, gone.status, nowhere.status]).toEqual([404, 404, 404])
  })
})
