import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { FIRST_YARD_PLAN, type YardPlan } from '@/shared/schemas/yardPlan'
import { buildOrganisation } from '@/tests/support/buildOrganisation'
import { buildPerson } from '@/tests/support/buildPerson'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { signInAs, type SignedInPerson } from '@/tests/support/signInAs'

let testApp: TestApp
let mine: SignedInPerson
let rival: SignedInPerson
let planner: SignedInPerson
beforeAll(async () => {
  testApp = await createTestApp()
  const { organisationId } = await buildOrganisation(testApp)
  const member = async (role: 'contractor' | 'planner') =>
    signInAs(testApp, await buildPerson(testApp, { organisationId, roles: [role] }))
  mine = await member('contractor')
  rival = await member('contractor')
  planner = await member('planner')
})
afterAll(() => testApp.close())

const read = (person: SignedInPerson) => testApp.http.get('/api/v1/yard/plan').set(person.bearer)
const save = (person: SignedInPerson, plan: object) =>
  testApp.http.put('/api/v1/yard/plan').set(person.bearer).send(plan)
const plan: YardPlan = {
  containerM3: 20,
  payloadT: 9,
  capacityTPerYear: 12_000,
  recoveryShares: { '17 01 01': 0.95, '17 02 01': 0.6 },
}

describe('the plan of a yard', () => {
  it('is a usual one until its contractor keeps another, and nobody else sees that', async () => {
    expect((await read(mine)).body).toEqual(FIRST_YARD_PLAN)

    expect((await save(mine, { ...plan, payloadT: 8 })).status).toBe(200)
    expect((await save(mine, plan)).body).toEqual(plan)

    expect((await read(mine)).body).toEqual(plan)
    expect((await read(rival)).body).toEqual(FIRST_YARD_PLAN)
    expect((await read(planner)).status).toBe(403)
  })

  it.each([
    ['a share over one', { recoveryShares: { '17 01 01': 1.5 } }, '/body/recoveryShares/17 01 01'],
    ['a code that is none', { recoveryShares: { concrete: 0.5 } }, '/body/recoveryShares/concrete'],
    ['a plant that takes in less than nothing', { capacityTPerYear: -1 }, '/body/capacityTPerYear'],
  ])('is refused with %s, at its field, and stays as it was', async (_what, fault, pointer) => {
    const before = (await read(mine)).body

    const answer = await save(mine, { ...plan, ...fault })

    expect(answer.status).toBe(422)
    expect(answer.body.faults.map((one: { pointer: string }) => one.pointer)).toContain(pointer)
    expect((await read(mine)).body).toEqual(before)
  })
})
