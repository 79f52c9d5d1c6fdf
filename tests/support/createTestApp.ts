import type { Express } from 'express'
import { QueryTypes, Sequelize } from 'sequelize'
import request, { type Agent } from 'supertest'
import type { Config } from '@/server/config'
import { createApp } from '@/server/createApp'
import { startWorkers } from '@/server/jobs/startWorkers'
import { createTestContext, type TestContext } from './createTestContext'
import { createTestDatabase } from './testDatabase'

/** The database as its owner sees it, past all policies: for arranging and for looking. */
export interface Owner {
  readonly sequelize: Sequelize
  rows<Row extends object>(sql: string, bind?: Readonly<Record<string, unknown>>): Promise<Row[]>
  run(sql: string, bind?: Readonly<Record<string, unknown>>): Promise<void>
}

/** The whole server but its socket, on a database of its own. */
export interface TestApp {
  readonly app: Express
  readonly context: TestContext
  readonly owner: Owner
  readonly appUrl: string
  readonly ownerUrl: string
  /** supertest against the app; paths begin with /api/v1. */
  readonly http: Agent
  close(): Promise<void>
}

/** Call in `beforeAll`; close in `afterAll`. */
export async function createTestApp(overrides: { config?: Partial<Config>; poolSize?: number } = {}): Promise<TestApp> {
  const { appUrl, ownerUrl, drop } = await createTestDatabase()
  const context = createTestContext(appUrl, overrides)
  await startWorkers(context)
  const app = createApp(context)
  const sequelize = new Sequelize(ownerUrl, { dialect: 'postgres', logging: false, pool: { max: 2 } })
  return {
    app,
    context,
    appUrl,
    ownerUrl,
    http: request(app) as unknown as Agent,
    owner: {
      sequelize,
      rows: <Row extends object>(sql: string, bind: Readonly<Record<string, unknown>> = {}) =>
        sequelize.query<Row>(sql, { bind: { ...bind }, type: QueryTypes.SELECT }),
      async run(sql, bind = {}) {
        await sequelize.query(sql, { bind: { ...bind }, type: QueryTypes.RAW })
      },
    },
    async close() {
      await context.database.close()
      await sequelize.close()
      await drop()
    },
  }
}
