import { Router } from 'express'
import { changePerson } from '@/server/commands/changePerson'
import { invitePerson } from '@/server/commands/invitePerson'
import type { Context } from '@/server/context'
import { listPeople } from '@/server/queries/listPeople'
import { mount } from '@/server/routes/mount'
import * as endpoints from '@/shared/api/people'

/** The people of an organisation. */
export function peopleRoutes(context: Context): Router {
  const router = Router()

  mount(router, endpoints.listPeople, async ({ signedIn, query }) => ({
    people: await context.database.withScope(signedIn, (scope) => listPeople(scope, query.role), { readOnly: true }),
  }))

  mount(router, endpoints.invitePerson, ({ signedIn, body }) => invitePerson(context, signedIn, body))

  mount(router, endpoints.changePerson, ({ signedIn, params, body }) =>
    changePerson(context, signedIn, params.personId, body),
  )

  return router
}
