import { Router } from 'express'
import { publishRun, withdrawPublication } from '@/server/commands/publishRun'
import type { Context } from '@/server/context'
import { readLoadsAhead } from '@/server/queries/readLoadsAhead'
import { readPublications } from '@/server/queries/readPublications'
import { mount } from '@/server/routes/mount'
import * as endpoints from '@/shared/api/publications'

const ONE_MOMENT = { readOnly: true, repeatableRead: true }

/** What planners publish, and what contractors read of it. */
export function publicationRoutes(context: Context): Router {
  const router = Router()
  const { database } = context

  mount(router, endpoints.listPublications, async ({ signedIn }) => ({
    publications: await database.withScope(signedIn, (scope) => readPublications(scope), ONE_MOMENT),
  }))

  mount(router, endpoints.publishRun, ({ signedIn, body }) => publishRun(context, signedIn, body))

  mount(router, endpoints.withdrawPublication, ({ signedIn, params, body }) =>
    withdrawPublication(context, signedIn, params.publicationId, body.reason),
  )

  mount(router, endpoints.listYardPublications, async ({ signedIn }) => ({
    publications: await database.withScope(
      signedIn,
      (scope) => readPublications(scope, { recipientId: scope.personId }),
      ONE_MOMENT,
    ),
  }))

  mount(router, endpoints.readLoadsAhead, ({ signedIn, params, query }) =>
    database.withScope(signedIn, (scope) => readLoadsAhead(scope, params.publicationId, query), ONE_MOMENT),
  )

  return router
}
