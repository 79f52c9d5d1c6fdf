import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { inviteFirstSteward } from './inviteFirstSteward'
import { isDatabaseEmpty } from './isDatabaseEmpty'
import { isDemoThere } from './isDemoThere'

const first = { organisationName: 'Ferrow Survey', name: 'Ama Okoro', email: 'Ama@Ferrow.invalid' }
let testApp: TestApp
beforeAll(async () => {
  testApp = await createTestApp()
})
afterAll(() => testApp.close())

const invite = () => inviteFirstSteward(testApp.ownerUrl, 'http://127.0.0.1:8080', first, testApp.context.now())
const tokenOf = (invited: { link: string } | undefined) => invited?.link.split('/').at(-1) ?? ''

it('makes one organisation, even when asked twice at once, and gives its steward a link until one joined', async () => {
  expect(await isDatabaseEmpty(testApp.ownerUrl)).toBe(true)

  const [one, two] = await Promise.all([invite(), invite()])
  const latest = await invite()

  expect(await testApp.owner.rows('SELECT name, is_demo FROM organisation')).toEqual([
    { name: 'Ferrow Survey', is_demo: false },
  ])
  expect([one?.email, two?.email, latest?.email]).toEqual(Array(3).fill('ama@ferrow.invalid'))
  expect((await testApp.http.get(`/api/v1/auth/invitations/${tokenOf(one)}`)).status).toBe(404)
  const joined = await testApp.http.post(`/api/v1/auth/invitations/${tokenOf(latest)}/accept`).send({
    name: 'Ama Okoro',
    password: 'four herons over the weir',
    device: { deviceId: randomUUID(), name: 'Desk' },
  })
  expect(joined.body.account.roles).toEqual(['steward', 'planner'])
  expect(await invite()).toBeUndefined()
  expect(await isDatabaseEmpty(testApp.ownerUrl)).toBe(false)
  expect(await isDemoThere(testApp.ownerUrl)).toBe(false)
})
