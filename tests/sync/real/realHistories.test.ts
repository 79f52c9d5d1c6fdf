import { once } from 'node:events'
import type { Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import fc from 'fast-check'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { historyOf } from '@/tests/sync/model/history'
import { playForReal } from './playForReal'

const SEED = 20_261_201
/** `npm run soak` plays 10,000. */
const HISTORIES = Number(process.env.REAL_HISTORIES ?? 160)
/** Histories at once, each in an organisation of its own: they wait for the disk more than they compute. */
const LANES = 4

let testApp: TestApp
let server: Server
let origin: string
beforeAll(async () => {
  testApp = await createTestApp({ poolSize: 12 })
  server = testApp.app.listen(0, '127.0.0.1')
  await once(server, 'listening')
  origin = `http://127.0.0.1:${(server.address() as AddressInfo).port}`
})
afterAll(async () => {
  await new Promise((resolve) => server.close(resolve))
  await testApp.close()
})

it('P G L holds for the client core, the server and PostgreSQL together, in histories of the model', async () => {
  const lanes = Array.from({ length: LANES }, (_, lane) =>
    fc.check(
      fc.asyncProperty(historyOf(40), (events) => playForReal(testApp, origin, events)),
      { numRuns: Math.ceil(HISTORIES / LANES), seed: SEED + lane, endOnFailure: true },
    ),
  )

  for (const result of await Promise.all(lanes)) {
    expect([result.seed, String(result.errorInstance ?? ''), result.counterexample]).toEqual([result.seed, '', null])
  }
}, 3_600_000)

it('is found out when a phone is broken on purpose', async () => {
  const result = await fc.check(
    fc.asyncProperty(historyOf(40), (events) => playForReal(testApp, origin, events, true)),
    { numRuns: 20, seed: SEED, endOnFailure: true },
  )

  expect(result.failed).toBe(true)
}, 120_000)
