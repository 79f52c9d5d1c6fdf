import type { Context } from '@/server/context'

/** Gives each job of the queue its worker. */
export async function startWorkers(context: Context): Promise<void> {
  await context.queue.work('send-mail', (message) => context.mailer.send(message))
}
