import { Router } from 'express'
import { addFinding } from '@/server/commands/addFinding'
import { giveTickets } from '@/server/commands/giveTickets'
import { listBuilding } from '@/server/commands/listBuilding'
import { withdrawListing } from '@/server/commands/withdrawListing'
import type { Context } from '@/server/context'
import { readListingPage, readListings } from '@/server/queries/readListings'
import { mount } from '@/server/routes/mount'
import * as endpoints from '@/shared/api/listings'

const ONE_MOMENT = { readOnly: true, repeatableRead: true }

/** Buildings with a known day of demolition: the desk lists them, the yard answers. */
export function listingRoutes(context: Context): Router {
  const router = Router()
  const { database } = context

  mount(router, endpoints.listListings, async ({ signedIn }) => ({
    listings: await database.withScope(signedIn, (scope) => readListings(scope), ONE_MOMENT),
  }))

  mount(router, endpoints.listBuilding, ({ signedIn, body }) => listBuilding(context, signedIn, body))

  mount(router, endpoints.readListing, ({ signedIn, params }) =>
    database.withScope(signedIn, (scope) => readListingPage(scope, params), ONE_MOMENT),
  )

  mount(router, endpoints.withdrawListing, ({ signedIn, params, body }) =>
    withdrawListing(context, signedIn, params.listingId, body.reason),
  )

  mount(router, endpoints.listYardListings, async ({ signedIn }) => ({
    listings: await database.withScope(
      signedIn,
      (scope) => readListings(scope, { recipientId: scope.personId }),
      ONE_MOMENT,
    ),
  }))

  mount(router, endpoints.readYardListing, ({ signedIn, params }) =>
    database.withScope(
      signedIn,
      (scope) => readListingPage(scope, { ...params, recipientId: scope.personId }),
      ONE_MOMENT,
    ),
  )

  mount(router, endpoints.addFinding, ({ signedIn, params, body }) =>
    addFinding(context, signedIn, params.listingId, body.text),
  )

  mount(router, endpoints.giveTickets, ({ signedIn, params, body }) =>
    giveTickets(context, signedIn, params.listingId, body.csv),
  )

  return router
}
