import { randomUUID } from 'node:crypto'
import jwt from 'jsonwebtoken'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createApp } from '@/server/createApp'
import { keyFor } from '@/server/middleware/accessToken'
import { session } from '@/shared/api/auth'
import { problem } from '@/shared/schemas/problem'
import { buildPerson, TEST_PASSWORD, type TestPerson } from '@/tests/support/buildPerson'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { createTestContext } from '@/tests/support/createTestContext'
import { signInAs } from '@/tests/support/signInAs'

let testApp: TestApp
beforeAll(async () => {
  testApp = await createTestApp()
})
afterAll(() => testApp.close())

const body = (person: TestPerson, password = TEST_PASSWORD, deviceId: string = randomUUID()) => ({
  email: person.email,
  password,
  device: { deviceId, name: 'Field phone' },
})
const signIn = (content: object) => testApp.http.post('/api/v1/auth/sign-in').send(content)

describe('signing in', () => {
  it('answers a short access token and the account, and sets a strict HttpOnly cookie', async () => {
    const person = await buildPerson(testApp, { roles: ['planner', 'surveyor'] })

    const answer = await signIn({ ...body(person), email: ` ${person.email.toUpperCase()}`.trim() })

    expect(answer.status).toBe(200)
    expect(session.parse(answer.body).account).toMatchObject({
      personId: person.personId,
      roles: ['planner', 'surveyor'],
    })
    expect(answer.body.expiresInS).toBe(600)
    const cookie = answer.get('Set-Cookie')?.[0] ?? ''
    expect(cookie).toMatch(
      /^tallystone-refresh=[\w-]{100,}; Max-Age=2592000; Path=\/; Expires=[^;]+; HttpOnly; SameSite=Strict$/,
    )
    expect(answer.get('Cache-Control')).toBe('no-store')
    const account = await testApp.http.get('/api/v1/account').set('Authorization', `Bearer ${answer.body.accessToken}`)
    expect(account.body).toEqual(answer.body.account)
  })

  it('keeps the cookie to https with the guarded name where people come by https', async () => {
    const context = createTestContext(testApp.appUrl, { config: { publicUrl: 'https://survey.ferrow.invalid' } })
    const person = await buildPerson(testApp)

    const answer = await request(createApp(context)).post('/api/v1/auth/sign-in').send(body(person))
    await context.database.close()

    expect(answer.get('Set-Cookie')?.[0]).toMatch(
      /^__Host-tallystone-refresh=[^;]+; .*Path=\/; .*HttpOnly; Secure; SameSite=Strict$/,
    )
    expect(answer.get('Strict-Transport-Security')).toBe('max-age=31536000')
  })

  it('M15 answers alike to a wrong password, an unknown address, an invited and a disabled person', async () => {
    const person = await buildPerson(testApp)
    const invited = await buildPerson(testApp, { status: 'invited' })
    const disabled = await buildPerson(testApp, { status: 'disabled' })
    const attempts = [
      body(person, 'not the password'),
      { ...body(person), email: 'nobody@ferrow.invalid' },
      body(invited),
      body(disabled),
    ]

    const answers = await Promise.all(attempts.map((attempt) => signIn(attempt)))

    for (const answer of answers) {
      expect(answer.status).toBe(401)
      expect({ ...answer.body, requestId: '' }).toEqual({ ...answers[0]?.body, requestId: '' })
      expect(problem.parse(answer.body).code).toBe('sign-in-refused')
      expect(answer.get('Set-Cookie')).toBeUndefined()
    }
  })

  it('names every fault of the input at once', async () => {
    const answer = await signIn({ email: 'no address', password: '', device: { deviceId: 'x' } })

    expect(answer.status).toBe(422)
    expect(problem.parse(answer.body).faults.map(({ pointer }) => pointer)).toEqual([
      '/body/email',
      '/body/password',
      '/body/device/deviceId',
      '/body/device/name',
    ])
  })

  it('asks for a new device number when the device belongs to another person', async () => {
    const first = await buildPerson(testApp)
    const second = await buildPerson(testApp, { organisationId: first.organisationId })
    const deviceId = randomUUID()
    await signIn(body(first, TEST_PASSWORD, deviceId))

    const answer = await signIn(body(second, TEST_PASSWORD, deviceId))

    expect(answer.status).toBe(409)
    expect(answer.body.code).toBe('device-of-another-person')
  })

  it('refuses a revoked device although the password is right', async () => {
    const person = await signInAs(testApp, await buildPerson(testApp))
    await testApp.owner.run('UPDATE device SET revoked_at = now() WHERE device_id = $deviceId', {
      deviceId: person.deviceId,
    })

    const answer = await signIn(body(person, TEST_PASSWORD, person.deviceId))

    expect(answer.status).toBe(403)
    expect(answer.body.code).toBe('device-revoked')
  })

  it('stores argon2id with a salt of its own, never the password', async () => {
    const [one, other] = await testApp.owner.rows<{ password_hash: string }>(
      'SELECT password_hash FROM person WHERE password_hash IS NOT NULL LIMIT 2',
    )

    expect(one?.password_hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$[^$]{22}\$/)
    expect(other).toBeDefined()
  })

  it('writes no address, password or token to the log', async () => {
    const person = await buildPerson(testApp)
    await signIn(body(person, 'not the password\r\n{"level":60}'))
    await signIn({ ...body(person), email: null })

    const log = JSON.stringify(testApp.context.logged)
    expect(log).not.toContain(person.email)
    expect(log).not.toContain('not the password')
  })
})

describe('throttling', () => {
  const throttled = async (config: object, run: (http: ReturnType<typeof request>) => Promise<void>) => {
    const context = createTestContext(testApp.appUrl, { config })
    await run(request(createApp(context)))
    await context.database.close()
  }

  it('stops one address after the configured number of attempts a minute, and says how long to wait', async () => {
    const person = await buildPerson(testApp)
    await throttled({ signInsPerMinute: 2 }, async (http) => {
      for (let attempt = 0; attempt < 2; attempt += 1) await http.post('/api/v1/auth/sign-in').send(body(person))
      const answer = await http.post('/api/v1/auth/sign-in').set('X-Forwarded-For', '203.0.113.9').send(body(person))

      expect(answer.status).toBe(429)
      expect(answer.body.code).toBe('too-many-attempts')
      expect(Number(answer.get('Retry-After'))).toBeGreaterThan(0)
    })
  })

  it('stops guessing at one account, while a device of its owner still gets in', async () => {
    const owner = await signInAs(testApp, await buildPerson(testApp))
    await throttled({}, async (http) => {
      const guesses = Array.from({ length: 11 }, () => http.post('/api/v1/auth/sign-in').send(body(owner, 'a guess')))
      const answers = await Promise.all(guesses)
      const own = await http.post('/api/v1/auth/sign-in').send(body(owner, TEST_PASSWORD, owner.deviceId))

      expect(answers.filter(({ status }) => status === 429)).toHaveLength(1)
      expect(own.status).toBe(200)
    })
  })
})

describe('an access token', () => {
  const account = (token: string) => testApp.http.get('/api/v1/account').set('Authorization', `Bearer ${token}`)
  const claimsOf = (token: string) => jwt.decode(token) as Record<string, unknown>
  const resign = (token: string, changes: object, options: jwt.SignOptions = {}, key?: Buffer) =>
    jwt.sign({ ...claimsOf(token), ...changes }, key ?? keyFor('access-token', testApp.context.config.sessionSecret), {
      algorithm: 'HS256',
      header: { alg: 'HS256', typ: 'at+jwt' },
      ...options,
    })

  it('M11 opens nothing when it was forged, is of another kind, for another audience, or has run out', async () => {
    const { token } = await signInAs(testApp, await buildPerson(testApp))
    const nowS = Math.floor(testApp.context.now().getTime() / 1000)
    const [head, claims] = token.split('.')
    const unsigned = Buffer.from('{"alg":"none","typ":"at+jwt"}').toString('base64url')
    const bad = {
      otherKey: resign(token, {}, {}, keyFor('refresh-seal', testApp.context.config.sessionSecret)),
      none: `${unsigned}.${claims}.`,
      otherAlgorithm: resign(token, {}, { algorithm: 'HS512', header: { alg: 'HS512', typ: 'at+jwt' } }),
      otherType: resign(token, {}, { header: { alg: 'HS256', typ: 'JWT' } }),
      otherAudience: resign(token, { aud: 'elsewhere' }),
      otherIssuer: resign(token, { iss: 'elsewhere' }),
      runOut: resign(token, { exp: nowS }),
      notYet: resign(token, { nbf: nowS + 60 }),
      noSession: resign(token, { sid: randomUUID() }),
      otherDevice: resign(token, { device: randomUUID() }),
      cut: `${head}.${claims}`,
      text: 'none',
    }

    expect((await account(token)).status).toBe(200)
    for (const [name, forged] of Object.entries(bad)) {
      const answer = await account(forged)
      expect([name, answer.status, answer.body.code]).toEqual([name, 401, 'not-signed-in'])
    }
  })

  it('carries no role: a change of roles holds at the next request', async () => {
    const person = await signInAs(testApp, await buildPerson(testApp, { roles: ['steward'] }))
    expect(JSON.stringify(claimsOf(person.token))).not.toContain('steward')

    await testApp.owner.run(`UPDATE person SET roles = '{surveyor}' WHERE person_id = $personId`, {
      personId: person.personId,
    })

    expect((await account(person.token)).body.roles).toEqual(['surveyor'])
  })

  it('dies at once with its session, its device and its person', async () => {
    const [session, device, disabled] = await Promise.all(
      [0, 1, 2].map(async () => signInAs(testApp, await buildPerson(testApp))),
    )
    await testApp.owner.run('UPDATE session SET revoked_at = now() WHERE session_id = $id', { id: session?.sessionId })
    await testApp.owner.run('UPDATE device SET revoked_at = now() WHERE device_id = $id', { id: device?.deviceId })
    await testApp.owner.run(`UPDATE person SET status = 'disabled' WHERE person_id = $id`, { id: disabled?.personId })

    const codes = await Promise.all(
      [session, device, disabled].map(async (person) => (await account(person?.token ?? '')).body.code),
    )

    expect(codes).toEqual(['not-signed-in', 'device-revoked', 'account-disabled'])
  })
})
