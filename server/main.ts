import { createServer, type Server } from 'node:http'
import { pino, type Logger } from 'pino'
import { ConfigError, readConfig, type Config } from './config'
import type { Context } from './context'
import { createApp } from './createApp'
import { openDatabase } from './database'
import { openQueue } from './jobs/openQueue'
import { startWorkers } from './jobs/startWorkers'
import { openMailer } from './mail/openMailer'
import { startMailSink } from './mail/startMailSink'
import { describeFault } from './middleware/describeFault'
import { createDiskPhotoStore } from './photos/diskPhotoStore'

const STOP_TIMEOUT_MS = 30_000

/** Environment → config → context → listen, and back in the opposite order. */
async function main(): Promise<void> {
  const config = readConfig(process.env)
  const log = pino({ level: config.logLevel, base: null })
  const context = await openContext(config, log)
  await startWorkers(context)
  const server = await listen(createServer(createApp(context)), config)
  log.info({ address: config.publicUrl, port: portOf(server) }, 'listening')
  stopOnSignal(server, context)
}

async function openContext(config: Config, log: Logger): Promise<Context> {
  const now = () => new Date()
  const database = openDatabase(config.databaseUrl)
  const queue = await openQueue(config.databaseUrl, log)
  const mailSink = config.mailUrl === undefined ? await openMailSink(config, now) : undefined
  return {
    config,
    database,
    queue,
    mailer: openMailer(config.mailUrl ?? mailSink?.url ?? '', config.mailFrom),
    ...(mailSink === undefined ? {} : { mailSink }),
    photoStore: createDiskPhotoStore(config.photoRoot),
    log,
    now,
  }
}

async function openMailSink(config: Config, now: () => Date) {
  if (config.environment === 'production') {
    throw new ConfigError('MAIL_URL is missing: in production invitations and resets need a mail server. Set it.')
  }
  return startMailSink(now)
}

function listen(server: Server, { port, host }: Config): Promise<Server> {
  return new Promise((resolve, reject) => {
    server.once('error', reject)
    server.listen(port, host, () => resolve(server))
  })
}

function portOf(server: Server): number | undefined {
  const address = server.address()
  return typeof address === 'object' ? address?.port : undefined
}

/** Stops accepting, lets running requests and jobs finish, then closes what was opened. */
function stopOnSignal(server: Server, context: Context): void {
  let isStopping = false
  const stop = async () => {
    if (isStopping) return
    isStopping = true
    const giveUp = setTimeout(() => process.exit(1), STOP_TIMEOUT_MS)
    giveUp.unref()
    const closed = new Promise<void>((resolve) => server.close(() => resolve()))
    server.closeIdleConnections()
    await closed
    await context.queue.stop()
    await context.mailer.close()
    await context.mailSink?.close()
    await context.database.close()
    context.log.info('stopped')
    process.exitCode = 0
    clearTimeout(giveUp)
  }
  process.once('SIGTERM', () => void stop())
  process.once('SIGINT', () => void stop())
}

main().catch((error: unknown) => {
  process.stderr.write(`${startFault(error)}\n`)
  process.exitCode = 1
  // Pools that were opened before the fault would keep the process alive.
  setTimeout(() => process.exit(1), 1_000).unref()
})

function startFault(error: unknown): string {
  if (error instanceof ConfigError) return error.message
  const { name, message, code } = describeFault(error)
  if (message?.startsWith('pg-boss')) return 'The server did not start: tables are missing or old. Run "migrate" first.'
  const isOfDatabase = message === undefined || /ECONN|ENOTFOUND|ETIMEDOUT/.test(message)
  const hint = isOfDatabase ? ' Is the database of DATABASE_URL up, and does it let us in?' : ''
  return `The server did not start: ${message ?? `${name} ${code ?? ''}`.trim()}.${hint}`
}
