import { randomBytes, randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { buildPerson, TEST_PASSWORD } from '@/tests/support/buildPerson'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'

const DAY_MS = 86_400_000
let testApp: TestApp
beforeAll(async () => {
  testApp = await createTestApp()
})
afterAll(() => testApp.close())

const rotationId = () => randomBytes(16).toString('hex')
const refresh = (cookie: string, rotation: string) =>
  testApp.http.post('/api/v1/auth/refresh').set('Cookie', cookie).send({ rotationId: rotation })
const cookieOf = (answer: { get(name: 'Set-Cookie'): string[] | undefined }) =>
  answer.get('Set-Cookie')?.[0]?.split(';')[0] ?? ''

async function signedInPerson() {
  const person = await buildPerson(testApp)
  const deviceId = randomUUID()
  const answer = await testApp.http
    .post('/api/v1/auth/sign-in')
    .send({ email: person.email, password: TEST_PASSWORD, device: { deviceId, name: 'Field phone' } })
  return { ...person, deviceId, cookie: cookieOf(answer), token: answer.body.accessToken as string }
}

const account = (token: string) => testApp.http.get('/api/v1/account').set('Authorization', `Bearer ${token}`)
const endedBecause = async (personId: string) =>
  (await testApp.owner.rows('SELECT revoked_because FROM session WHERE person_id = $personId', { personId }))[0]

describe('rotation', () => {
  it('exchanges the cookie for a new one and a fresh access token', async () => {
    const person = await signedInPerson()

    const answer = await refresh(person.cookie, rotationId())

    expect(answer.status).toBe(200)
    expect(cookieOf(answer)).not.toBe(person.cookie)
    expect((await account(answer.body.accessToken)).status).toBe(200)
  })

  it('F10 gives the same successor when the same rotation is asked again, however late', async () => {
    const person = await signedInPerson()
    const rotation = rotationId()

    const first = await refresh(person.cookie, rotation)
    testApp.context.clock.advanceMs(3 * DAY_MS)
    const again = await refresh(person.cookie, rotation)

    expect(again.status).toBe(200)
    expect(cookieOf(again)).toBe(cookieOf(first))
    expect((await refresh(cookieOf(again), rotationId())).status).toBe(200)
  })

  it('F10 gives one successor to two requests of the same rotation at the same time', async () => {
    const person = await signedInPerson()
    const rotation = rotationId()

    const answers = await Promise.all([1, 2, 3].map(() => refresh(person.cookie, rotation)))

    expect(answers.map(({ status }) => status)).toEqual([200, 200, 200])
    expect(new Set(answers.map(cookieOf)).size).toBe(1)
  })

  it('F11 ends the family when a spent token comes with another rotation, and refuses the honest holder too', async () => {
    const person = await signedInPerson()
    const honest = await refresh(person.cookie, rotationId())

    const thief = await refresh(person.cookie, rotationId())

    expect([thief.status, thief.body.code]).toEqual([401, 'session-ended'])
    expect((await refresh(cookieOf(honest), rotationId())).status).toBe(401)
    expect((await account(honest.body.accessToken)).status).toBe(401)
    expect(await endedBecause(person.personId)).toEqual({ revoked_because: 'token-reused' })
    const audit = await testApp.owner.rows(
      'SELECT action FROM audit_entry WHERE person_id = $personId ORDER BY audit_id',
      {
        personId: person.personId,
      },
    )
    expect(audit.at(-1)).toEqual({ action: 'refresh-token-reused' })
  })

  it('F11 ends the family when a lost rotation is repeated after its successor was used', async () => {
    const person = await signedInPerson()
    const rotation = rotationId()
    const child = await refresh(person.cookie, rotation)
    await refresh(cookieOf(child), rotationId())

    expect((await refresh(person.cookie, rotation)).status).toBe(401)
    expect(await endedBecause(person.personId)).toEqual({ revoked_because: 'token-reused' })
  })

  it('answers a made-up token without harm to any session', async () => {
    const person = await signedInPerson()
    const [name = '', value = ''] = person.cookie.split('=')
    const flipped = value.slice(0, 60) + (value[60] === 'A' ? 'B' : 'A') + value.slice(61)

    expect((await refresh(`${name}=${flipped}`, rotationId())).body.code).toBe('session-ended')
    expect((await refresh(`${name}=${person.personId}`, rotationId())).body.code).toBe('session-ended')
    expect((await testApp.http.post('/api/v1/auth/refresh').send({ rotationId: rotationId() })).body.code).toBe(
      'not-signed-in',
    )
    expect((await refresh(person.cookie, 'short')).status).toBe(422)
    expect((await refresh(person.cookie, rotationId())).status).toBe(200)
  })

  it('slides for thirty days of not being used', async () => {
    const person = await signedInPerson()
    testApp.context.clock.advanceMs(29 * DAY_MS)
    const inTime = await refresh(person.cookie, rotationId())
    testApp.context.clock.advanceMs(31 * DAY_MS)
    const tooLate = await refresh(cookieOf(inTime), rotationId())

    expect([inTime.status, tooLate.status]).toEqual([200, 401])
    expect(await endedBecause(person.personId)).toEqual({ revoked_because: 'not-used' })
  })

  it('ends after 180 days in any case, and the cookie does not outlive it', async () => {
    const person = await signedInPerson()
    let cookie = person.cookie
    const statuses: number[] = []
    let maxAge = ''
    for (let day = 25; day <= 200; day += 25) {
      testApp.context.clock.advanceMs(25 * DAY_MS)
      const answer = await refresh(cookie, rotationId())
      statuses.push(answer.status)
      if (answer.status !== 200) break
      maxAge = /Max-Age=(\d+)/.exec(answer.get('Set-Cookie')?.[0] ?? '')?.[1] ?? ''
      cookie = cookieOf(answer)
    }

    expect(statuses).toEqual([200, 200, 200, 200, 200, 200, 200, 401])
    expect(Number(maxAge)).toBe(5 * 86_400)
  })

  it('tells a revoked device and a disabled person so', async () => {
    const [lost, left] = [await signedInPerson(), await signedInPerson()]
    await testApp.owner.run('UPDATE device SET revoked_at = now() WHERE device_id = $id', { id: lost.deviceId })
    await testApp.owner.run(`UPDATE person SET status = 'disabled' WHERE person_id = $id`, { id: left.personId })

    expect((await refresh(lost.cookie, rotationId())).body.code).toBe('device-revoked')
    expect((await refresh(left.cookie, rotationId())).body.code).toBe('account-disabled')
  })
})

describe('M14 the guard of cookie addresses', () => {
  const from = (origin: string, host?: string) => {
    const asked = testApp.http.post('/api/v1/auth/sign-out').set('Origin', origin)
    return host === undefined ? asked : asked.set('Host', host)
  }

  it('refuses a page of another site, and takes our own and loopback by either name', async () => {
    expect((await from('https://elsewhere.invalid')).body.code).toBe('other-origin')
    expect((await from('null')).body.code).toBe('other-origin')
    expect((await from('http://elsewhere.invalid:8080', 'elsewhere.invalid:8080')).body.code).toBe('other-origin')
    expect((await testApp.http.post('/api/v1/auth/sign-out').set('Sec-Fetch-Site', 'cross-site')).status).toBe(403)
    expect((await from('http://127.0.0.1:8080')).status).toBe(200)
    expect((await from('http://localhost:8080', 'localhost:8080')).status).toBe(200)
  })
})

describe('signing out', () => {
  it('ends the session at once and takes the cookie back', async () => {
    const person = await signedInPerson()

    const answer = await testApp.http.post('/api/v1/auth/sign-out').set('Cookie', person.cookie)

    expect(answer.status).toBe(200)
    expect(answer.get('Set-Cookie')?.[0]).toMatch(/^tallystone-refresh=; Path=\/; Expires=Thu, 01 Jan 1970/)
    expect((await account(person.token)).status).toBe(401)
    expect((await refresh(person.cookie, rotationId())).status).toBe(401)
    expect(await endedBecause(person.personId)).toEqual({ revoked_because: 'signed-out' })
  })

  it('is no error without a session', async () => {
    expect((await testApp.http.post('/api/v1/auth/sign-out')).status).toBe(200)
    expect((await testApp.http.post('/api/v1/auth/sign-out').set('Cookie', 'tallystone-refresh=x')).status).toBe(200)
  })
})
