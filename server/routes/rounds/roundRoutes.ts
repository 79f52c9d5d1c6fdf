import { Router } from 'express'
import { createRound } from '@/server/commands/createRound'
import { removeBeat } from '@/server/commands/removeBeat'
import { saveBeat, shareOutBeats } from '@/server/commands/saveBeat'
import type { Context } from '@/server/context'
import { readRound } from '@/server/queries/readRound'
import { readRounds } from '@/server/queries/readRounds'
import { mount } from '@/server/routes/mount'
import * as endpoints from '@/shared/api/rounds'

const ONE_MOMENT = { readOnly: true, repeatableRead: true }

/** Rounds, and the beats they are shared out in. */
export function roundRoutes(context: Context): Router {
  const router = Router()
  const { database } = context

  mount(router, endpoints.listRounds, async ({ signedIn }) => ({
    rounds: await database.withScope(signedIn, (scope) => readRounds(scope), ONE_MOMENT),
  }))

  mount(router, endpoints.createRound, ({ signedIn, body }) => createRound(context, signedIn, body))

  mount(router, endpoints.readRound, ({ signedIn, params }) =>
    database.withScope(signedIn, (scope) => readRound(scope, params.roundId), ONE_MOMENT),
  )

  mount(router, endpoints.createBeat, ({ signedIn, params, body }) => saveBeat(context, signedIn, params, body))

  mount(router, endpoints.shareOutBeats, ({ signedIn, params, body }) =>
    shareOutBeats(context, signedIn, params.roundId, body.beats),
  )

  mount(router, endpoints.changeBeat, ({ signedIn, params, body }) => saveBeat(context, signedIn, params, body))

  mount(router, endpoints.removeBeat, ({ signedIn, params }) => removeBeat(context, signedIn, params))

  return router
}
