import type { Router } from 'express'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { allRoutes } from '@/server/routes/allRoutes'
import { contract } from '@/shared/api/contract'
import { ROLES, type Role } from '@/shared/schemas/person'
import { problem } from '@/shared/schemas/problem'
import { buildPerson } from '@/tests/support/buildPerson'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { signInAs } from '@/tests/support/signInAs'

const SOME_ID = '019a0000-0000-7000-8000-000000000000'
const endpoints = Object.entries(contract)

let testApp: TestApp
let mounted: string[]
beforeAll(async () => {
  testApp = await createTestApp()
  mounted = allRoutes.flatMap((routes) => namesIn(routes(testApp.context)))
})
afterAll(() => testApp.close())

/** METHOD and path of every route on a router. */
function namesIn(router: Router): string[] {
  return router.stack.flatMap(({ route }) => {
    if (!route) return ['a router or middleware beside the contract']
    const methods = new Set(route.stack.map(({ method }) => method.toUpperCase()))
    return [...methods].map((method) => `${method} ${route.path}`)
  })
}

const call = (method: string, path: string, bearer: Readonly<Record<string, string>> = {}) => {
  const address = `/api/v1${path.replace(/:token/, 'x'.repeat(43)).replace(/:\w+/g, SOME_ID)}`
  return testApp.http[method.toLowerCase() as 'get'](address).set(bearer)
}

describe('the route table', () => {
  it('has every endpoint of the contract exactly once, and nothing beside it', () => {
    const wanted = endpoints.map(([, { method, path }]) => `${method} ${path}`)

    expect(new Set(wanted).size).toBe(wanted.length)
    expect([...mounted].sort()).toEqual([...wanted].sort())
  })

  it('refuses every endpoint that is not public without a token, whatever else is wrong with the request', async () => {
    for (const [name, { method, path, audience }] of endpoints) {
      if (audience === 'public' || !mounted.includes(`${method} ${path}`)) continue
      const answer = await call(method, path)
      expect([name, answer.status, problem.parse(answer.body).code]).toEqual([name, 401, 'not-signed-in'])
    }
  })

  it('refuses every role that an endpoint is not for', async () => {
    const people = new Map<Role, Readonly<Record<string, string>>>()
    for (const role of ROLES) {
      people.set(role, (await signInAs(testApp, await buildPerson(testApp, { roles: [role] }))).bearer)
    }
    for (const [name, { method, path, audience }] of endpoints) {
      if (typeof audience === 'string' || !mounted.includes(`${method} ${path}`)) continue
      for (const role of ROLES.filter((candidate) => !audience.includes(candidate))) {
        const answer = await call(method, path, people.get(role))
        expect([name, role, answer.status, answer.body.code]).toEqual([name, role, 403, 'forbidden'])
      }
    }
  })

  it('M2 knows no ids that nobody has: every addressed thing is not found, or its input is refused', async () => {
    for (const role of ROLES) {
      const { bearer } = await signInAs(testApp, await buildPerson(testApp, { roles: [role] }))
      for (const [name, { method, path, audience }] of endpoints) {
        if (typeof audience === 'string' || !audience.includes(role) || !path.includes(':')) continue
        if (!mounted.includes(`${method} ${path}`)) continue
        const { status } = await call(method, path, bearer)
        expect([name, role, [400, 404, 409, 422].includes(status) || status]).toEqual([name, role, true])
      }
    }
  })

  it('answers unknown addresses and unreadable bodies as problems without stack, path or version', async () => {
    const unknown = await testApp.http.get('/api/v1/nothing/here')
    const unreadable = await testApp.http.post('/api/v1/auth/sign-in').type('json').send('{"email":')
    const tooLarge = await testApp.http.post('/api/v1/auth/sign-in').send({ email: 'x'.repeat(2_200_000) })

    expect([unknown.status, unreadable.status, tooLarge.status]).toEqual([404, 400, 413])
    for (const answer of [unknown, unreadable, tooLarge]) {
      expect(answer.get('Content-Type')).toBe('application/problem+json; charset=utf-8')
      expect(answer.get('X-Request-Id')).toBe(problem.parse(answer.body).requestId)
      expect(JSON.stringify(answer.body)).not.toMatch(/node_modules|\.ts|\\n +at |express|postgres/i)
    }
  })
})
