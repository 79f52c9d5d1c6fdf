import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { assertNothingLost } from './testPhone'
import { testTown, type TestTown } from './testTown'

let testApp: TestApp
let town: TestTown
beforeAll(async () => {
  testApp = await createTestApp()
})
afterAll(() => testApp.close())
beforeEach(async () => {
  town = await testTown(testApp)
})

const storeys = (aboveGround: number) => ({ storeys: { aboveGround, knownBy: 'seen' as const } })

describe('handing in', () => {
  it('P1 applies a bag in order and shows it by pull', async () => {
    const { phone, round } = town
    await phone.pull()
    const [sheetId = ''] = round.buildingIds
    phone.saveSheet(sheetId, { finding: { kind: 'standing' }, ...storeys(2) })
    phone.saveSheet(sheetId, { footprint: { footprintM2: 100, knownBy: 'register' } })

    const answer = await phone.push()
    await phone.pull()

    expect(answer.results.map(({ status }) => status)).toEqual(['applied', 'applied'])
    expect(answer).toMatchObject({ lastSeq: 2, minSchema: 1 })
    expect(phone.bag).toEqual([])
    expect(phone.sheet(sheetId)?.fields).toMatchObject({
      answers: { finding: { kind: 'standing' }, ...storeys(2), footprint: { footprintM2: 100, knownBy: 'register' } },
      review: { state: 'handed-in' },
      revision: 1,
      recordedByName: 'Ann',
    })
    await assertNothingLost(testApp, [phone])
  })
})
