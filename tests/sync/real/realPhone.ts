import { randomUUID } from 'node:crypto'
import Database from 'better-sqlite3'
import { appendMutation, type NewMutation } from '@/db/appendMutation'
import { createDriver } from '@/db/createDriver'
import { createSyncStore } from '@/db/createSyncStore'
import type { Driver, SqlValue } from '@/db/driver.types'
import { migrate } from '@/db/migrate'
import type { SyncStore } from '@/db/syncStore.types'
import { renewDevice } from '@/shared/api/sync'
import { SYNC_SCHEMA } from '@/shared/schemas/sync'
import { ApiError, UnreachableError } from '@/sync/api/ApiError'
import { createApiClient, type ApiClient } from '@/sync/api/createApiClient'
import { pullChanges } from '@/sync/pullChanges'
import { pushOutbox } from '@/sync/pushOutbox'
import type { TestPerson } from '@/tests/support/buildPerson'
import type { TestApp } from '@/tests/support/createTestApp'
import { memoryTwin } from '@/tests/support/memoryTwin'
import { signInAs } from '@/tests/support/signInAs'
import type { Fault } from '@/tests/sync/model/modelPhone'

interface BaseRow {
  readonly id: string
  readonly type: string
  readonly building_id: string | null
  readonly change_no: number
  readonly fields: string
}
interface Copy {
  readonly bytes: Buffer
  readonly deviceId: string
}

/** The client core of the product on a database in memory, over HTTP to the real server, with a network that fails. */
export class RealPhone {
  readonly saved: { readonly id: string }[] = []
  readonly wiped = new Set<string>()
  /** Broken on purpose: drops what it sent when no answer comes. */
  isForgetful = false
  /** Its app speaks a version that the server does not know: it may pull and not push (P12). */
  isOfAnotherVersion = false
  #fault: Fault = 'ok'
  #copy: Copy | null = null
  #database = new Database(':memory:')
  #driver: Driver = driverOf(this.#database)
  #store: SyncStore = this.#openStore()

  private constructor(
    readonly testApp: TestApp,
    readonly origin: string,
    readonly person: TestPerson,
    public deviceId: string,
    private token: string,
  ) {}

  static async open(testApp: TestApp, origin: string, person: TestPerson): Promise<RealPhone> {
    const { deviceId, token } = await signInAs(testApp, person)
    const phone = new RealPhone(testApp, origin, person, deviceId, token)
    await migrate(phone.#driver)
    return phone
  }

  #openStore(): SyncStore {
    const nowhere = { write: async () => {}, read: async () => null, remove: async () => {} }
    const store = createSyncStore({
      driver: this.#driver,
      photoFiles: nowhere,
      twin: memoryTwin(),
      owner: { ...this.person, deviceId: () => this.deviceId, sign: async () => null },
      readRoom: async () => ({ level: 'roomy' }),
      now: () => new Date('2026-10-13T14:08:00Z'),
      changed: () => {},
      subscribe: () => () => {},
    })
    // A rebuild would hide that the rows had come to differ.
    return { ...store, startRebuild: () => Promise.reject(new Error('the rows differ from the server')) }
  }

  base(type: string): Promise<BaseRow[]> {
    return this.#driver.all<BaseRow>('SELECT * FROM base WHERE type = ? ORDER BY id', [type])
  }

  async everything(): Promise<string> {
    const rows = await this.#driver.all('SELECT type, id, change_no, fields FROM base ORDER BY type, id')
    return JSON.stringify(rows)
  }

  async bagIds(): Promise<string[]> {
    const rows = await this.#driver.all<{ mutation_id: string }>('SELECT mutation_id FROM outbox')
    return rows.map(({ mutation_id }) => mutation_id)
  }

  /** Only what is on the phone can be written on. */
  async save(buildingId: string, change: WithoutSeen<NewMutation>, seenOf?: number): Promise<void> {
    const [building] = await this.#driver.all('SELECT id FROM base WHERE type = ? AND id = ?', ['building', buildingId])
    if (!building) return
    const id = randomUUID()
    this.saved.push({ id })
    const seen = seenOf ?? (await this.#changeOnScreen(buildingId))
    const stamp = { newId: () => id, now: () => new Date('2026-10-13T14:08:00Z'), elapsedMs: () => 5 }
    await this.#driver.transaction((inside) => appendMutation(inside, { ...change, seen }, buildingId, stamp))
  }

  async #changeOnScreen(sheetId: string): Promise<number> {
    const [row] = await this.#driver.all<{ change_no: number }>(
      `SELECT change_no FROM base WHERE type = 'sheet' AND id = ? UNION ALL SELECT change_no FROM gone_sheet WHERE id = ?`,
      [sheetId, sheetId],
    )
    return row?.change_no ?? 0
  }

  async sync(fault: Fault): Promise<void> {
    this.#fault = fault
    const parts = {
      store: this.#store,
      api: this.#api(),
      deviceId: () => this.deviceId,
      enrolAnew: () => this.#enrolAnew(),
    }
    try {
      if (fault !== 'pull-only') {
        await pushOutbox({ ...parts, onProgress: () => {} }).catch((error: unknown) => {
          if (!(error instanceof ApiError) || error.code !== 'server-too-old') throw error
        })
      }
      await pullChanges({ ...parts, onProgress: () => {}, now: () => new Date('2026-10-13T14:08:00Z') })
    } catch (error) {
      // refused as a whole, nothing taken: the bag stays as it is
      if (error instanceof ApiError && error.code === 'device-revoked') return
      if (!(error instanceof UnreachableError)) throw error
      if (this.isForgetful) await this.#driver.run('DELETE FROM outbox')
    }
  }

  keepCopy(): void {
    this.#copy = { bytes: this.#database.serialize(), deviceId: this.deviceId }
  }

  /** As the person does it: the backup is played back, and they sign in again. */
  async restoreCopy(): Promise<void> {
    if (!this.#copy) return
    const before = await this.bagIds()
    this.#database = new Database(this.#copy.bytes)
    this.#driver = driverOf(this.#database)
    this.#store = this.#openStore()
    const kept = new Set(await this.bagIds())
    for (const id of before) if (!kept.has(id)) this.wiped.add(id)
    const { deviceId, token } = await signInAs(this.testApp, this.person, { deviceId: this.#copy.deviceId })
    this.deviceId = deviceId
    this.token = token
  }

  async #enrolAnew(): Promise<void> {
    const deviceId = randomUUID()
    const { accessToken } = await this.#plainApi().call(renewDevice, { body: { deviceId, name: 'Test phone' } })
    this.token = accessToken
    this.deviceId = deviceId
    await this.#store.renumber(deviceId)
  }

  #plainApi(): ApiClient {
    return createApiClient({ accessToken: () => this.token, renew: async () => null, origin: this.origin })
  }

  #meetOnTheWay(fault: Fault): void {
    if (this.#fault === fault) throw new UnreachableError('lost on the way')
  }

  #asOwnVersion<Input extends { body?: unknown }>(input: Input | undefined): Input | undefined {
    if (!this.isOfAnotherVersion || input === undefined) return input
    return { ...input, body: { ...(input.body as object), schema: SYNC_SCHEMA + 1 } }
  }

  /** The first calls of a kind meet the fault; what is asked after an answer was lost is never asked. */
  #api(): ApiClient {
    const plain = this.#plainApi()
    return {
      ...plain,
      call: async (endpoint, given, signal) => {
        const isPush = endpoint.method === 'POST'
        const input = isPush ? this.#asOwnVersion(given) : given
        this.#meetOnTheWay(isPush ? 'request-lost' : 'pull-lost')
        const first = plain.call(endpoint, input, signal)
        // it is waited for below, after the second one
        first.catch(() => undefined)
        if (isPush && this.#fault === 'twice') await plain.call(endpoint, input, signal).catch(() => undefined)
        const answer = await first
        if (isPush) this.#meetOnTheWay('answer-lost')
        return answer
      },
    }
  }
}

type WithoutSeen<Kind> = Kind extends NewMutation ? Omit<Kind, 'seen'> : never

function driverOf(database: Database.Database): Driver {
  return createDriver({
    async run(sql: string, values: readonly SqlValue[] = []) {
      if (values.length === 0) database.exec(sql)
      else database.prepare(sql).run(...values)
    },
    async all<Row>(sql: string, values: readonly SqlValue[] = []): Promise<Row[]> {
      return database.prepare<SqlValue[], Row>(sql).all(...values)
    },
    async close() {
      database.close()
    },
  })
}
