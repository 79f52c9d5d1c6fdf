import { Router } from 'express'
import type { Context } from '@/server/context'
import { readEditions, readFullEdition } from '@/server/queries/readEditions'
import { mount } from '@/server/routes/mount'
import * as endpoints from '@/shared/api/factorBook'

const ONE_MOMENT = { readOnly: true, repeatableRead: true }

/** Editions of the factor book and their rows, each with its source. */
export function factorBookRoutes({ database }: Context): Router {
  const router = Router()

  mount(router, endpoints.listEditions, async ({ signedIn }) => ({
    editions: await database.withScope(signedIn, (scope) => readEditions(scope), ONE_MOMENT),
  }))

  mount(router, endpoints.readEdition, ({ signedIn, params }) =>
    database.withScope(signedIn, (scope) => readFullEdition(scope, params.editionId), ONE_MOMENT),
  )

  return router
}
