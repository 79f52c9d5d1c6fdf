import { randomUUID } from 'node:crypto'
import { once } from 'node:events'
import { mkdtempSync, rmSync } from 'node:fs'
import { createServer, type RequestListener, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import os from 'node:os'
import path from 'node:path'
import express from 'express'
import { Client } from 'pg'
import { QueryTypes, Sequelize } from 'sequelize'
import { appendMutation } from '@/db/appendMutation'
import { createSyncStore } from '@/db/createSyncStore'
import type { Driver } from '@/db/driver.types'
import { migrate as migrateDevice } from '@/db/migrate'
import { createApp } from '@/server/createApp'
import { migrate } from '@/server/migrate'
import { startThrowAwayCluster } from '@/server/ops/throwAwayCluster.mjs'
import type { SheetAnswers } from '@/shared/schemas/sheet'
import { createApiClient } from '@/sync/api/createApiClient'
import { pullChanges } from '@/sync/pullChanges'
import { pushOutbox } from '@/sync/pushOutbox'
import { buildOrganisation } from '@/tests/support/buildOrganisation'
import { buildBeat, buildRound } from '@/tests/support/buildRound'
import { createTestContext } from '@/tests/support/createTestContext'
import { memoryDriver } from '@/tests/support/memoryDriver'
import { memoryTwin } from '@/tests/support/memoryTwin'
import { signInAs, type SignedInPerson } from '@/tests/support/signInAs'
import { copyTemplate, prepareTestServer } from '@/tests/support/testDatabaseServer'

/** One figure; `ratio` is value over floor where there is one. */
export interface BenchRow {
  readonly name: string
  readonly value: number
  readonly unit: string
  readonly floor: number | null
  readonly ratio: number | null
}

const SHEETS = Number(process.env.BENCH_SHEETS ?? 10_000)
const SMALL = 60

/**
 * Handing in and pulling with the whole product: client core on a SQLite file, HTTP, server with sign-in, judging,
 * merging and row-level security, PostgreSQL with fsync. The floor is the same JSON over HTTP into one table with a key
 * and nothing else.
 */
export async function rows(): Promise<BenchRow[]> {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'tallystone-bench-'))
  const cluster = await startThrowAwayCluster()
  try {
    const template = await prepareTestServer(cluster.adminUrl, ({ ownerUrl }) => migrate(ownerUrl))
    const floor = await floorPerSecond((await copyTemplate(template)).ownerUrl)
    const asItIs = await measure(await copyTemplate(template), folder)
    const withoutKeys = await measure(await copyTemplate(template), folder, DROP_SHEET_KEYS)
    return [
      row('floor: sheets into one table', floor, 'sheets/s', null),
      row('push', asItIs.push, 'sheets/s', floor),
      row('push without the three foreign keys of a sheet', withoutKeys.push, 'sheets/s', asItIs.push),
      row('replay of the same bag', asItIs.replay, 'sheets/s', asItIs.push),
      row('pull into SQLite', asItIs.pull, 'rows/s', null),
      row('push of one change, p95', asItIs.oneP95, 'ms', null),
      row('pull with nothing to do, p95', asItIs.idleP95, 'ms', null),
    ]
  } finally {
    await cluster.stop()
    rmSync(folder, { recursive: true, force: true })
  }
}

/** What they cost is measured on a database of its own, so that the decision to have them can be looked at again. */
const DROP_SHEET_KEYS = ['round_id', 'outline_id', 'recorded_by'].map(
  (column) => `ALTER TABLE sheet DROP CONSTRAINT sheet_organisation_id_${column}_fkey`,
)

const row = (name: string, value: number, unit: string, floor: number | null): BenchRow => ({
  name,
  value,
  unit,
  floor,
  ratio: floor === null ? null : value / floor,
})

/** About 1 kB as JSON, as a sheet of a careful surveyor is. */
function answersOf(index: number): SheetAnswers {
  return {
    storeys: { aboveGround: 1 + (index % 9), knownBy: 'seen' },
    footprint: { footprintM2: 80 + (index % 700), knownBy: 'guessed' },
    attic: { floorShare: 0.5, knownBy: 'seen' },
    notes: { text: `sheet ${index}: ${'rendered brick, one shop window, yard wall. '.repeat(14)}` },
  }
}

async function measure(
  { appUrl, ownerUrl }: { appUrl: string; ownerUrl: string },
  folder: string,
  before: string[] = [],
) {
  const context = createTestContext(appUrl, { poolSize: 8 })
  const sequelize = new Sequelize(ownerUrl, { dialect: 'postgres', logging: false, pool: { max: 2 } })
  const owner = {
    sequelize,
    rows: <Row extends object>(sql: string, bind: Readonly<Record<string, unknown>> = {}) =>
      sequelize.query<Row>(sql, { bind: { ...bind }, type: QueryTypes.SELECT }),
    async run(sql: string, bind: Readonly<Record<string, unknown>> = {}) {
      await sequelize.query(sql, { bind: { ...bind }, type: QueryTypes.RAW })
    },
  }
  for (const sql of before) await owner.run(sql)
  const { server, origin } = await listen(createApp(context))
  try {
    const parts = { owner, context }
    const { person, buildingIds } = await buildTown(parts)
    const first = await openPhone(folder, origin, person)
    await first.record(buildingIds)
    const push = SHEETS / (await secondsOf(() => first.push()))
    const replay = SHEETS / (await secondsOf(() => first.pushAgain()))
    const second = await openPhone(folder, origin, await signInAs(parts, person))
    const pull = (2 * SHEETS + 1) / (await secondsOf(() => second.pull()))
    const oneP95 = await p95Of(async (turn) => {
      await second.record([buildingIds[turn] ?? ''])
      return secondsOf(() => second.push())
    })
    await second.pull()
    const idleP95 = await p95Of(() => secondsOf(() => second.pull()))
    return { push, replay, pull, oneP95, idleP95 }
  } finally {
    server.close()
    server.closeAllConnections()
    await context.database.close()
    await sequelize.close()
  }
}

type Parts = Parameters<typeof signInAs>[0]

async function buildTown(parts: Parts): Promise<{ person: SignedInPerson; buildingIds: readonly string[] }> {
  const { organisationId } = await buildOrganisation(parts)
  const personId = randomUUID()
  await parts.owner.run(
    `INSERT INTO person (organisation_id, person_id, email, name, roles, status)
     VALUES ($organisationId, $personId, $email, 'Ann', ARRAY['surveyor', 'planner'], 'active')`,
    { organisationId, personId, email: `${personId}@bench.example` },
  )
  const testPerson = { organisationId, personId, email: '', password: '', name: 'Ann', roles: ['surveyor'] as const }
  const person = await signInAs(parts, testPerson as never)
  const round = await buildRound(parts, { organisationId, createdBy: personId, outlineCount: SHEETS })
  await buildBeat(parts, round, { surveyorId: personId, buildingIds: round.buildingIds })
  await parts.owner.run('ANALYZE')
  return { person, buildingIds: round.buildingIds }
}

/** A phone on a file of SQLite, as durable as the product's. */
async function openPhone(folder: string, origin: string, person: SignedInPerson) {
  const driver: Driver = memoryDriver(path.join(folder, `${randomUUID()}.db`))
  await driver.run('PRAGMA journal_mode = WAL')
  await driver.run('PRAGMA synchronous = FULL')
  await migrateDevice(driver)
  const now = () => new Date('2026-10-13T14:08:00Z')
  const store = createSyncStore({
    driver,
    photoFiles: { write: async () => {}, read: async () => null, remove: async () => {} },
    twin: memoryTwin(),
    owner: { ...person, deviceId: () => person.deviceId, sign: async () => null },
    readRoom: async () => ({ level: 'roomy' }),
    now,
    changed: () => {},
    subscribe: () => () => {},
  })
  const api = createApiClient({ accessToken: () => person.token, renew: async () => null, origin })
  const enrolAnew = () => Promise.reject(new Error('no device is restored here'))
  const parts = { store, api, deviceId: () => person.deviceId, enrolAnew, now, onProgress: () => {} }
  return {
    record: (buildingIds: readonly string[]) =>
      driver.transaction(async (inside) => {
        const stamp = { newId: () => randomUUID(), now, elapsedMs: () => 5 }
        for (const [index, entity] of buildingIds.entries()) {
          const set = { op: 'set', type: 'sheet', entity, seen: 0, set: answersOf(index) } as const
          await appendMutation(inside, set, entity, stamp)
        }
      }),
    push: () => pushOutbox(parts),
    async pushAgain() {
      await driver.run('UPDATE outbox SET status = NULL')
      await pushOutbox(parts)
    },
    pull: () => pullChanges(parts),
  }
}

async function floorPerSecond(ownerUrl: string): Promise<number> {
  const client = new Client({ connectionString: ownerUrl })
  await client.connect()
  await client.query('CREATE TABLE floor_sheet (id uuid PRIMARY KEY, body jsonb NOT NULL)')
  const app = express()
  app.use(express.json({ limit: '2mb' }))
  app.post('/floor', (request, response) => {
    const sql = `INSERT INTO floor_sheet SELECT (value ->> 'id')::uuid, value FROM jsonb_array_elements($1::jsonb)`
    client.query(sql, [JSON.stringify(request.body)]).then(
      () => response.json({}),
      (error: unknown) => response.status(500).json({ error: String(error) }),
    )
  })
  const { server, origin } = await listen(app)
  const sheets = Array.from({ length: SHEETS }, (_, index) => ({ id: randomUUID(), ...answersOf(index) }))
  const seconds = await secondsOf(async () => {
    for (let from = 0; from < SHEETS; from += 500) {
      const body = JSON.stringify(sheets.slice(from, from + 500))
      const headers = { 'Content-Type': 'application/json' }
      const answer = await fetch(`${origin}/floor`, { method: 'POST', headers, body })
      if (!answer.ok) throw new Error(await answer.text())
    }
  })
  server.close()
  server.closeAllConnections()
  await client.end()
  return SHEETS / seconds
}

async function listen(app: RequestListener): Promise<{ server: Server; origin: string }> {
  const server = createServer(app).listen(0, '127.0.0.1')
  await once(server, 'listening')
  return { server, origin: `http://127.0.0.1:${(server.address() as AddressInfo).port}` }
}

async function secondsOf(work: () => Promise<unknown>): Promise<number> {
  const startMs = performance.now()
  await work()
  return (performance.now() - startMs) / 1_000
}

/** 95th of a hundred, in milliseconds. */
async function p95Of(work: (turn: number) => Promise<number>): Promise<number> {
  const seconds: number[] = []
  for (let turn = 0; turn < SMALL; turn += 1) seconds.push(await work(turn))
  seconds.sort((one, other) => one - other)
  return (seconds[Math.floor(SMALL * 0.95)] ?? 0) * 1_000
}
