import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { buildPerson, TEST_PASSWORD } from '@/tests/support/buildPerson'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { signInAs } from '@/tests/support/signInAs'

const NEW_PASSWORD = 'seven herons over the weir'
const HOUR_MS = 3_600_000
let testApp: TestApp
beforeAll(async () => {
  testApp = await createTestApp()
})
afterAll(() => testApp.close())

const device = () => ({ deviceId: randomUUID(), name: 'Field phone' })
const post = (path: string, body: object) => testApp.http.post(`/api/v1${path}`).send(body)
const signIn = (email: string, password: string) => post('/auth/sign-in', { email, password, device: device() })

async function invited(overrides: { name?: string } = {}) {
  const steward = await signInAs(testApp, await buildPerson(testApp, { roles: ['steward'] }))
  const email = `new-${randomUUID()}@ferrow.invalid`
  const answer = await post('/people/invitations', {
    email,
    name: overrides.name ?? 'Bo Lindqvist',
    roles: ['surveyor'],
  }).set(steward.bearer)
  return { steward, email, personId: answer.body.personId as string, token: testApp.context.mailer.tokenTo(email) }
}

/** The reset route answers before it works; wait for the message it leads to. */
async function resetTokenOf(email: string): Promise<string> {
  const count = testApp.context.mailer.messages.length
  await post('/auth/password-reset', { email })
  await expect.poll(() => testApp.context.mailer.messages.length).toBe(count + 1)
  return testApp.context.mailer.tokenTo(email)
}

describe('an invitation', () => {
  it('says what it offers, lets the person join once, and signs the device in', async () => {
    const { email, token } = await invited()

    const offer = await testApp.http.get(`/api/v1/auth/invitations/${token}`)
    const joined = await post(`/auth/invitations/${token}/accept`, {
      name: 'Bo L.',
      password: NEW_PASSWORD,
      device: device(),
    })
    const again = await post(`/auth/invitations/${token}/accept`, {
      name: 'X',
      password: NEW_PASSWORD,
      device: device(),
    })

    expect(offer.body).toEqual({ organisationName: 'Ferrow Survey', email, name: 'Bo Lindqvist', roles: ['surveyor'] })
    expect(joined.status).toBe(200)
    expect(joined.body.account).toMatchObject({ name: 'Bo L.', email, roles: ['surveyor'] })
    expect(joined.get('Set-Cookie')?.[0]).toContain('HttpOnly')
    expect([again.status, again.body.code]).toEqual([404, 'link-not-valid'])
    expect((await signIn(email, NEW_PASSWORD)).status).toBe(200)
  })

  it('runs out after seven days', async () => {
    const { token } = await invited()
    testApp.context.clock.advanceMs(7 * 24 * HOUR_MS + 1)

    const answers = [
      await testApp.http.get(`/api/v1/auth/invitations/${token}`),
      await post(`/auth/invitations/${token}/accept`, { name: 'Bo', password: NEW_PASSWORD, device: device() }),
    ]
    testApp.context.clock.advanceMs(-7 * 24 * HOUR_MS - 1)

    expect(answers.map(({ body }) => body.code)).toEqual(['link-not-valid', 'link-not-valid'])
  })

  it('is not spent by a password that is refused', async () => {
    const { email, token } = await invited()

    for (const password of ['Password123', 'aaaaaaaaaaaa', email, 'short']) {
      const answer = await post(`/auth/invitations/${token}/accept`, { name: 'Bo', password, device: device() })
      expect([password, answer.status, answer.body.faults[0].pointer]).toEqual([password, 422, '/body/password'])
    }
    expect(
      (await post(`/auth/invitations/${token}/accept`, { name: 'Bo', password: NEW_PASSWORD, device: device() }))
        .status,
    ).toBe(200)
  })

  it('keeps only a digest of its token, and sends words that load nothing and run nothing', async () => {
    const { email, token } = await invited({ name: '<img src=x onerror=alert(1)>' })

    const kept = JSON.stringify(await testApp.owner.rows('SELECT * FROM one_time_token'))
    const { html, text, subject } = testApp.context.mailer.lastTo(email)

    expect(kept).not.toContain(token)
    expect(JSON.stringify(testApp.context.queue.sent)).not.toContain(token)
    expect(html).not.toMatch(/<img|<script/)
    expect(text).toContain(`http://127.0.0.1:8080/join/${token}`)
    expect(subject).toBe('Ferrow Survey invites you to Tallystone')
  })

  it('cannot be used to reset, nor a made-up token for either', async () => {
    const { token } = await invited()

    expect((await post('/auth/password-reset/confirm', { token, password: NEW_PASSWORD })).body.code).toBe(
      'link-not-valid',
    )
    expect((await testApp.http.get(`/api/v1/auth/invitations/${'a'.repeat(43)}`)).body.code).toBe('link-not-valid')
    expect((await testApp.http.get('/api/v1/auth/invitations/short')).body.code).toBe('link-not-valid')
  })
})

describe('a password reset', () => {
  it('M15 answers alike for known and unknown addresses, and mails only the known', async () => {
    const person = await buildPerson(testApp)
    const disabled = await buildPerson(testApp, { status: 'disabled' })
    testApp.context.mailer.messages.length = 0

    const answers = []
    for (const email of [person.email, disabled.email, 'nobody@ferrow.invalid']) {
      answers.push(await post('/auth/password-reset', { email }))
    }
    await expect.poll(() => testApp.context.mailer.messages.length).toBe(1)

    expect(answers.map(({ status, body }) => [status, body])).toEqual(Array(3).fill([202, {}]))
    expect(testApp.context.mailer.messages.map(({ to }) => to)).toEqual([person.email])
  })

  it('sets the password once, ends every session, and leaves the devices enrolled', async () => {
    const person = await signInAs(testApp, await buildPerson(testApp))
    const token = await resetTokenOf(person.email)

    const done = await post('/auth/password-reset/confirm', { token, password: NEW_PASSWORD })
    const again = await post('/auth/password-reset/confirm', { token, password: TEST_PASSWORD })

    expect(done.status).toBe(200)
    expect(again.body.code).toBe('link-not-valid')
    expect((await testApp.http.get('/api/v1/account').set(person.bearer)).status).toBe(401)
    expect((await signIn(person.email, TEST_PASSWORD)).status).toBe(401)
    expect((await signIn(person.email, NEW_PASSWORD)).status).toBe(200)
  })

  it('makes an earlier link stop working, and runs out after an hour', async () => {
    const person = await buildPerson(testApp)
    const first = await resetTokenOf(person.email)
    const second = await resetTokenOf(person.email)
    const confirm = (token: string) => post('/auth/password-reset/confirm', { token, password: NEW_PASSWORD })

    expect((await confirm(first)).body.code).toBe('link-not-valid')
    testApp.context.clock.advanceMs(HOUR_MS + 1)
    expect((await confirm(second)).body.code).toBe('link-not-valid')
    testApp.context.clock.advanceMs(-HOUR_MS - 1)
    expect((await confirm(second)).status).toBe(200)
  })

  it('floods nobody: five links an hour to one address, answered alike for an unknown one', async () => {
    const ask = async (email: string) => {
      const statuses: number[] = []
      for (let time = 0; time < 6; time += 1) statuses.push((await post('/auth/password-reset', { email })).status)
      return statuses
    }
    const person = await buildPerson(testApp)

    expect(await ask(person.email)).toEqual([202, 202, 202, 202, 202, 429])
    expect(await ask('nobody-else@ferrow.invalid')).toEqual([202, 202, 202, 202, 202, 429])
  })
})
