import { sendLink } from '@/server/commands/sendLink'
import type { Context } from '@/server/context'
import { computeRun } from './computeRun'
import { startTidying } from './startTidying'

/** Gives each job of the queue its worker, and starts what is done once a day. */
export async function startWorkers(context: Context): Promise<void> {
  await context.queue.work('compute-run', (job) => computeRun(context, job))
  await context.queue.work('send-mail', (message) => context.mailer.send(message))
  await context.queue.work('send-link', (link) => sendLink(context, link))
  startTidying(context)
}
