import { Router } from 'express'
import type { Context } from '@/server/context'
import { readLoadReceipt } from '@/server/queries/readLoadReceipt'
import { readReceipt } from '@/server/queries/readReceipt'
import { mount } from '@/server/routes/mount'
import * as endpoints from '@/shared/api/receipts'

const ONE_MOMENT = { readOnly: true, repeatableRead: true }

/** The way back from a figure to its parts and sources. */
export function receiptRoutes({ database }: Context): Router {
  const router = Router()

  mount(router, endpoints.readReceipt, ({ signedIn, params, query }) => {
    const figure = {
      kind: query.kind,
      material: query.material,
      fromYear: query.fromYear ?? null,
      toYear: query.toYear ?? null,
      use: query.use ?? null,
      structure: query.structure ?? null,
      period: query.period ?? null,
      buildingId: query.buildingId ?? null,
    }
    return database.withScope(signedIn, (scope) => readReceipt(scope, params.runId, figure), ONE_MOMENT)
  })

  mount(router, endpoints.readLoadReceipt, ({ signedIn, params, query }) =>
    database.withScope(signedIn, (scope) => readLoadReceipt(scope, params.publicationId, query), ONE_MOMENT),
  )

  return router
}
