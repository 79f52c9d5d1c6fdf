import type { Logger } from 'pino'
import type { Config } from './config'
import type { Database } from './database'
import type { Queue } from './jobs/queue'
import type { Mailer } from './mail/mailer'
import type { MailSink } from './mail/startMailSink'
import type { PhotoStore } from './photos/photoStore'

/** What every route and job works with; made once in main.ts, or by a test. */
export interface Context {
  readonly config: Config
  readonly database: Database
  readonly mailer: Mailer
  /** Only where no mail server is set: the messages that went nowhere. */
  readonly mailSink?: MailSink
  readonly queue: Queue
  readonly photoStore: PhotoStore
  readonly log: Logger
  /** The server's clock. Device clocks never order anything. */
  readonly now: () => Date
}
