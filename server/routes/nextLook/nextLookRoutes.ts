import { Router } from 'express'
import { chooseLookFigure } from '@/server/commands/chooseLookFigure'
import type { Context } from '@/server/context'
import { readDeviceLooks } from '@/server/queries/readDeviceLooks'
import { readNextLook } from '@/server/queries/readNextLook'
import { mount } from '@/server/routes/mount'
import * as endpoints from '@/shared/api/nextLook'

const ONE_MOMENT = { readOnly: true, repeatableRead: true }

/** Where looking makes a figure surer: for the desk with all there is to it, for a phone in short. */
export function nextLookRoutes({ database, now }: Context): Router {
  const router = Router()

  mount(router, endpoints.readNextLook, ({ signedIn, params, query }) =>
    database.withScope(signedIn, (scope) => readNextLook(scope, params.roundId, query), ONE_MOMENT),
  )

  mount(router, endpoints.chooseLookFigure, ({ signedIn, params, body }) =>
    database.withScope(signedIn, (scope) => chooseLookFigure(scope, params.roundId, body)),
  )

  mount(router, endpoints.readDeviceLooks, async ({ signedIn }) => ({
    rounds: await database.withScope(signedIn, (scope) => readDeviceLooks(scope, now), ONE_MOMENT),
  }))

  return router
}
