import { Router } from 'express'
import { discardEdition } from '@/server/commands/discardEdition'
import { draftEdition } from '@/server/commands/draftEdition'
import { issueEdition } from '@/server/commands/issueEdition'
import { removeFactorRow } from '@/server/commands/removeFactorRow'
import { saveFactorRow } from '@/server/commands/saveFactorRow'
import type { Context } from '@/server/context'
import { readEditions, readFullEdition } from '@/server/queries/readEditions'
import { mount } from '@/server/routes/mount'
import * as endpoints from '@/shared/api/factorBook'

const ONE_MOMENT = { readOnly: true, repeatableRead: true }

/** Editions of the factor book and their rows, each with its source. */
export function factorBookRoutes(context: Context): Router {
  const router = Router()
  const { database } = context

  mount(router, endpoints.listEditions, async ({ signedIn }) => ({
    editions: await database.withScope(signedIn, (scope) => readEditions(scope), ONE_MOMENT),
  }))

  mount(router, endpoints.readEdition, ({ signedIn, params }) =>
    database.withScope(signedIn, (scope) => readFullEdition(scope, params.editionId), ONE_MOMENT),
  )

  mountDrafts(router, context)
  return router
}

function mountDrafts(router: Router, context: Context): void {
  mount(router, endpoints.draftEdition, ({ signedIn, body }) => draftEdition(context, signedIn, body))

  mount(router, endpoints.discardEdition, async ({ signedIn, params }) => {
    await discardEdition(context, signedIn, params.editionId)
    return {}
  })

  mount(router, endpoints.issueEdition, ({ signedIn, params, body }) =>
    issueEdition(context, signedIn, { ...params, ...body }),
  )

  mount(router, endpoints.addFactorRow, ({ signedIn, params, body }) =>
    saveFactorRow(context, signedIn, { ...params, row: body }),
  )

  mount(router, endpoints.changeFactorRow, ({ signedIn, params, body }) =>
    saveFactorRow(context, signedIn, { ...params, row: body }),
  )

  mount(router, endpoints.removeFactorRow, async ({ signedIn, params }) => {
    await removeFactorRow(context, signedIn, params)
    return {}
  })
}
