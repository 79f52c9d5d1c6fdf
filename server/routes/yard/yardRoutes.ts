import { Router } from 'express'
import { saveYardPlan } from '@/server/commands/saveYardPlan'
import type { Context } from '@/server/context'
import { readYardPlan } from '@/server/queries/readYardPlan'
import { mount } from '@/server/routes/mount'
import * as endpoints from '@/shared/api/yard'

/** What a contractor plans with. */
export function yardRoutes({ database }: Context): Router {
  const router = Router()

  mount(router, endpoints.readYardPlan, ({ signedIn }) =>
    database.withScope(signedIn, readYardPlan, { readOnly: true }),
  )

  mount(router, endpoints.saveYardPlan, ({ signedIn, body }) =>
    database.withScope(signedIn, (scope) => saveYardPlan(scope, body)),
  )

  return router
}
