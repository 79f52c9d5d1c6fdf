import { Router } from 'express'
import { discardQuarantined } from '@/server/commands/discardQuarantined'
import { importBag } from '@/server/commands/importBag'
import { releaseQuarantined } from '@/server/commands/releaseQuarantined'
import type { Context } from '@/server/context'
import { listQuarantine } from '@/server/queries/listQuarantine'
import { mount } from '@/server/routes/mount'
import * as endpoints from '@/shared/api/quarantine'

/** Work that was set apart, and what a steward decides about it. */
export function quarantineRoutes(context: Context): Router {
  const router = Router()

  mount(router, endpoints.listQuarantine, ({ signedIn, query }) =>
    context.database.withScope(signedIn, (scope) => listQuarantine(scope, query), { readOnly: true }),
  )

  mount(router, endpoints.releaseQuarantined, ({ signedIn, params, body }) =>
    releaseQuarantined(context, signedIn, params.mutationId, body),
  )

  mount(router, endpoints.discardQuarantined, ({ signedIn, params, body }) =>
    discardQuarantined(context, signedIn, params.mutationId, body),
  )

  mount(router, endpoints.importBag, ({ signedIn, body }) => importBag(context, signedIn, body))

  return router
}
