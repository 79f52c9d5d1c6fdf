import { pino } from 'pino'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createTestDatabase } from '@/tests/support/testDatabase'
import { openQueue } from './openQueue'
import type { Queue } from './queue'

let database: Awaited<ReturnType<typeof createTestDatabase>>
let queue: Queue
const logged: string[] = []
const log = pino({ level: 'info' }, { write: (line: string) => void logged.push(line) })
beforeAll(async () => {
  database = await createTestDatabase()
  queue = await openQueue(database.appUrl, log)
})
afterAll(async () => {
  await queue.stop()
  await database.drop()
})

const mail = (to: string) => ({ to, subject: 's', text: 't', html: 'h' })

describe('the queue, as the role of the app', () => {
  it('is ready, and hands each job to its worker once', async () => {
    const taken: string[] = []
    await queue.send('send-mail', mail('one@ferrow.invalid'))
    await queue.work('send-mail', async ({ to }) => void taken.push(to))
    await queue.send('send-mail', mail('two@ferrow.invalid'))

    await expect
      .poll(() => [...taken].sort(), { timeout: 10_000 })
      .toEqual(['one@ferrow.invalid', 'two@ferrow.invalid'])
    expect(await queue.isReady()).toBe(true)
  })

  it('keeps a failed job for another try, and logs neither its payload nor its people', async () => {
    const wanted = { organisationId: 'o', personId: 'secret-person', purpose: 'invitation' as const }
    let tries = 0
    await queue.work('send-link', async () => {
      tries += 1
      throw new Error('the mail server did not take it')
    })
    await queue.send('send-link', wanted)

    await expect.poll(() => tries, { timeout: 10_000 }).toBe(1)
    await expect.poll(() => logged.join(''), { timeout: 5_000 }).toContain('"job":"send-link"')
    expect(logged.join('')).not.toContain('secret-person')
  })

  it('finishes a running job before it stops', async () => {
    const other = await openQueue(database.appUrl, log)
    let isDone = false
    let isRunning = false
    await other.work('compute-run', async () => {
      isRunning = true
      await new Promise((resolve) => setTimeout(resolve, 700))
      isDone = true
    })
    await other.send('compute-run', { organisationId: 'o', personId: 'p', runId: 'r' })
    await expect.poll(() => isRunning, { timeout: 10_000 }).toBe(true)

    await other.stop()

    expect(isDone).toBe(true)
  })
})

it('does not start on a database without its tables', async () => {
  const elsewhere = new URL(database.appUrl)
  elsewhere.port = '1'
  await expect(openQueue(elsewhere.href, log)).rejects.toThrow()
})
