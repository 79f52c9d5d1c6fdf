import { Router } from 'express'
import { cancelRun } from '@/server/commands/cancelRun'
import { startRun } from '@/server/commands/startRun'
import type { Context } from '@/server/context'
import { readRunBuildings, readRunResult, readRuns, readRunSummary } from '@/server/queries/readRuns'
import { mount } from '@/server/routes/mount'
import * as endpoints from '@/shared/api/runs'

const ONE_MOMENT = { readOnly: true, repeatableRead: true }

/** Runs: started, watched, read. */
export function runRoutes(context: Context): Router {
  const router = Router()
  const { database } = context

  mount(router, endpoints.listRuns, async ({ signedIn, query }) => ({
    runs: await database.withScope(signedIn, (scope) => readRuns(scope, query), ONE_MOMENT),
  }))

  mount(router, endpoints.startRun, ({ signedIn, body }) => startRun(context, signedIn, body))

  mount(router, endpoints.readRun, ({ signedIn, params: { runId } }) =>
    database.withScope(
      signedIn,
      async (scope) => ({ ...(await readRunSummary(scope, runId)), result: await readRunResult(scope, runId) }),
      ONE_MOMENT,
    ),
  )

  mount(router, endpoints.readRunBuildings, async ({ signedIn, params }) => ({
    buildings: await database.withScope(signedIn, (scope) => readRunBuildings(scope, params.runId), ONE_MOMENT),
  }))

  mount(router, endpoints.cancelRun, ({ signedIn, params }) => cancelRun(context, signedIn, params.runId))

  return router
}
