import { cpSync, mkdtempSync, rmSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { startMailSink, type MailSink } from '@/server/mail/startMailSink'
import { tryPort } from '@/server/ops/freePort.mjs'
import { startProcess, type StartedProcess } from '@/server/ops/serveProcess.mjs'
import { copyTemplate, type TestDatabase, type TestDatabaseServer } from './testDatabaseServer'

/** Environment variable by which the set-up tells the workers what it made. */
export const E2E_STATE = 'TALLYSTONE_E2E_STATE'
const ROOT = process.cwd()
const SERVER = path.join(ROOT, '.build', 'server', 'main.mjs')
const TEST_SECRET = 'only-for-stories-0123456789abcdef0123456789abcdef'

export interface DemoAccount {
  readonly role: string
  readonly name: string
  readonly email: string
  readonly password: string
}

export interface E2eState {
  readonly migrated: TestDatabaseServer
  readonly demo: TestDatabaseServer
  readonly accounts: readonly DemoAccount[]
  /** Photos of the demo; each server gets a copy. */
  readonly photoRoot: string
}

/** The built product on a database of its own. */
export interface AppServer {
  /** Where it is reached; the same after a stop and a start. */
  readonly url: string
  /** The owner's address, for arranging and looking past row-level security. */
  readonly ownerUrl: string
  readonly mail: MailSink
  /** Account of the demo with this role. @throws when there is none, as on an empty server */
  account(role: string): DemoAccount
  /** As if the network or the server were gone; browsers get no answer. */
  stop(): Promise<void>
  start(): Promise<void>
  /** Stops it and removes database, photos and mail. */
  close(): Promise<void>
}

/**
 * Starts the built server.
 *
 * @param content `demo`: Saltmarsh Hythe with its accounts; `empty`: tables only
 * @param options.webRoot another folder of the built app than the one that was built
 */
export async function startAppServer(
  content: 'demo' | 'empty',
  { webRoot }: { readonly webRoot?: string } = {},
): Promise<AppServer> {
  const state = readState()
  const database = await copyTemplate(content === 'demo' ? state.demo : state.migrated)
  const photoRoot = mkdtempSync(path.join(os.tmpdir(), 'tallystone-photos-'))
  if (content === 'demo') cpSync(state.photoRoot, photoRoot, { recursive: true })
  const mail = await startMailSink(() => new Date())
  const port = (await tryPort(0)) ?? 0
  const url = `http://127.0.0.1:${port}`
  const settings = {
    ...serverSettings(database, { photoRoot, port }),
    MAIL_URL: mail.url,
    ...(webRoot ? { WEB_ROOT: webRoot } : {}),
  }
  let running: StartedProcess | undefined
  const stop = async () => {
    await running?.stop()
    running = undefined
  }
  const start = async () => {
    running ??= await startProcess({
      args: ['--enable-source-maps', SERVER],
      cwd: ROOT,
      env: settings,
      readyUrl: `${url}/api/ready`,
    })
  }
  await start()
  return {
    url,
    ownerUrl: database.ownerUrl,
    mail,
    account: (role) => demoAccount(content === 'demo' ? state.accounts : [], role),
    stop,
    start,
    async close() {
      await stop()
      await mail.close()
      await database.drop()
      rmSync(photoRoot, { recursive: true, force: true })
    },
  }
}

/** The environment of a server under test. */
export function serverSettings(
  { appUrl, ownerUrl }: Pick<TestDatabase, 'appUrl' | 'ownerUrl'>,
  { photoRoot, port }: { photoRoot: string; port: number },
): NodeJS.ProcessEnv {
  return {
    PATH: process.env.PATH,
    NODE_ENV: 'test',
    PORT: String(port),
    DATABASE_URL: appUrl,
    DATABASE_OWNER_URL: ownerUrl,
    SESSION_SECRET: TEST_SECRET,
    WEB_ROOT: path.join(ROOT, '.build', 'web'),
    PHOTO_ROOT: photoRoot,
    LOG_LEVEL: process.env.LOG_LEVEL ?? 'error',
    SIGN_IN_RATE: '1000',
  }
}

function demoAccount(accounts: readonly DemoAccount[], role: string): DemoAccount {
  const account = accounts.find((candidate) => candidate.role === role)
  if (!account) throw new Error(`no demo account is a ${role}; there are ${accounts.map((one) => one.role).join(', ')}`)
  return account
}

function readState(): E2eState {
  const text = process.env[E2E_STATE]
  if (text === undefined) throw new Error('startAppServer works within Playwright, whose set-up makes the databases')
  return JSON.parse(text) as E2eState
}
