import type { JobName, JobPayloads, Queue } from '@/server/jobs/queue'

export interface FakeQueue extends Queue {
  /** Every job that was sent, in order. */
  readonly sent: { name: JobName; payload: JobPayloads[JobName] }[]
  /** Jobs for which no worker was there, or whose worker is held, wait here until `runWaiting`. */
  runWaiting(): Promise<void>
  /** From now on jobs wait for `runWaiting`. */
  hold(): void
  setReady(isReady: boolean): void
}

/** Runs a job within `send` as soon as a worker is there; a job that fails is thrown to the sender. */
export function fakeQueue(): FakeQueue {
  const sent: FakeQueue['sent'] = []
  const waiting: FakeQueue['sent'] = []
  const workers = new Map<JobName, (payload: JobPayloads[JobName]) => Promise<void>>()
  let isHeld = false
  let isReady = true
  return {
    sent,
    async send(name, payload) {
      sent.push({ name, payload })
      const worker = workers.get(name)
      if (worker && !isHeld) await worker(payload)
      else waiting.push({ name, payload })
    },
    async work(name, handler) {
      workers.set(name, handler as (payload: JobPayloads[JobName]) => Promise<void>)
    },
    async runWaiting() {
      for (const job of waiting.splice(0)) await workers.get(job.name)?.(job.payload)
    },
    hold() {
      isHeld = true
    },
    setReady(ready) {
      isReady = ready
    },
    isReady: async () => isReady,
    async stop() {},
  }
}
