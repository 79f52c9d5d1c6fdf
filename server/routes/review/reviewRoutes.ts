import { Router } from 'express'
import { checkSheets } from '@/server/commands/checkSheets'
import { sendBackSheet } from '@/server/commands/sendBackSheet'
import { settleConflict } from '@/server/commands/settleConflict'
import type { Context } from '@/server/context'
import { readReviewQueue } from '@/server/queries/readReviewQueue'
import { readReviewSheet } from '@/server/queries/readReviewSheet'
import { mount } from '@/server/routes/mount'
import * as endpoints from '@/shared/api/review'

const ONE_MOMENT = { readOnly: true, repeatableRead: true }

/** What came in, and the planner's word on it. */
export function reviewRoutes(context: Context): Router {
  const router = Router()
  const { database } = context

  mount(router, endpoints.reviewQueue, ({ signedIn, query }) =>
    database.withScope(signedIn, (scope) => readReviewQueue(scope, query), ONE_MOMENT),
  )

  mount(router, endpoints.readSheet, ({ signedIn, params }) =>
    database.withScope(signedIn, (scope) => readReviewSheet(scope, params.sheetId), ONE_MOMENT),
  )

  mount(router, endpoints.checkSheets, ({ signedIn, body }) => checkSheets(context, signedIn, body.sheets))

  mount(router, endpoints.sendBackSheet, ({ signedIn, params, body }) =>
    sendBackSheet(context, signedIn, { ...params, ...body }),
  )

  mount(router, endpoints.settleConflict, ({ signedIn, params, body }) =>
    settleConflict(context, signedIn, { ...params, ...body }),
  )

  return router
}
