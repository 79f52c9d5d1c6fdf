import { Router } from 'express'
import { enrolDeviceKey } from '@/server/commands/enrolDeviceKey'
import { pushMutations } from '@/server/commands/pushMutations'
import { renewDevice } from '@/server/commands/renewDevice'
import { surrenderBag } from '@/server/commands/surrenderBag'
import type { Context } from '@/server/context'
import { throttleByAddress, throttleByKey } from '@/server/middleware/throttle'
import { pullChanges } from '@/server/queries/pullChanges'
import { readDeviceEdition } from '@/server/queries/readDeviceEdition'
import { mount } from '@/server/routes/mount'
import * as endpoints from '@/shared/api/sync'

const MINUTE_MS = 60_000
/** A phone that hands in ten thousand entries one by one stays below it; one in a loop does not. */
const REQUESTS_PER_MINUTE = 6_000
/** A bag is handed over once; a stranger may not try for long. */
const SURRENDERS_PER_MINUTE = 20

/** What phones hand in and pull. */
export function syncRoutes(context: Context): Router {
  const router = Router()
  const perDevice = throttleByKey({
    windowMs: MINUTE_MS,
    limit: REQUESTS_PER_MINUTE,
    key: (request) => request.signedIn?.deviceId ?? '',
  })

  mount(router, endpoints.pushMutations, ({ signedIn, body }) => pushMutations(context, signedIn, body), [perDevice])

  mount(router, endpoints.pullChanges, ({ signedIn, query }) => pullChanges(context, signedIn, query), [perDevice])

  mount(router, endpoints.renewDevice, ({ signedIn, body }) => renewDevice(context, signedIn, body))

  mount(router, endpoints.enrolDeviceKey, ({ signedIn, body }) => enrolDeviceKey(context, signedIn, body))

  mount(router, endpoints.surrenderBag, ({ body }) => surrenderBag(context, body), [
    throttleByAddress(SURRENDERS_PER_MINUTE),
  ])

  mount(router, endpoints.readDeviceEdition, ({ signedIn }) =>
    context.database.withScope(signedIn, (scope) => readDeviceEdition(scope), { readOnly: true }),
  )

  return router
}
