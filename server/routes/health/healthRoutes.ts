import { Router } from 'express'
import type { Context } from '@/server/context'
import { Refusal } from '@/server/errors'
import { readReady } from '@/server/queries/readReady'
import { mount } from '@/server/routes/mount'
import { VERSION } from '@/server/version'
import { readHealth, readReadiness } from '@/shared/api/health'

/** Is the process up, and can it work. */
export function healthRoutes(context: Context): Router {
  const router = Router()

  mount(router, readHealth, async () => ({ status: 'up' as const, version: VERSION }))

  mount(router, readReadiness, async () => {
    const ready = await readReady(context)
    const missing = Object.entries(ready).flatMap(([part, answers]) => (answers ? [] : [part]))
    if (missing.length === 0) return ready
    throw new Refusal(
      503,
      'not-ready',
      `Not ready: ${missing.join(', ')}. Nothing was changed; try again in a moment.`,
      missing.map((part) => ({ pointer: `/${part}`, code: 'does-not-answer', detail: `${part} does not answer` })),
      { 'Retry-After': '5' },
    )
  })

  return router
}
