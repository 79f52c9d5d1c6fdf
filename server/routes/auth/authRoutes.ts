import { Router, type Response } from 'express'
import { provePassword } from '@/server/auth/provePassword'
import { clearRefreshCookie, readRefreshCookie, setRefreshCookie } from '@/server/auth/refreshCookie'
import { acceptInvitation } from '@/server/commands/acceptInvitation'
import { askPasswordReset } from '@/server/commands/askPasswordReset'
import { endSession } from '@/server/commands/endSession'
import type { OpenedSession } from '@/server/commands/openSession'
import { rotateSession } from '@/server/commands/rotateSession'
import { setPassword } from '@/server/commands/setPassword'
import { signIn } from '@/server/commands/signIn'
import type { Context } from '@/server/context'
import { notSignedIn, Refusal } from '@/server/errors'
import { describeFault } from '@/server/middleware/describeFault'
import { requireOwnOrigin } from '@/server/middleware/requireOwnOrigin'
import { readInvitation } from '@/server/queries/readInvitation'
import { mount } from '@/server/routes/mount'
import * as endpoints from '@/shared/api/auth'
import { authThrottles, type AuthThrottles } from './authThrottles'

/** Signing in and out, and the links that are mailed. */
export function authRoutes(context: Context): Router {
  const router = Router()
  const throttles = authThrottles(context)
  mountSessions(router, context, throttles)
  mountLinks(router, context, throttles)
  return router
}

function mountSessions(router: Router, context: Context, throttles: AuthThrottles): void {
  const { config } = context
  const ownOrigin = requireOwnOrigin(config)
  const prove = provePassword(context)

  mount(
    router,
    endpoints.signIn,
    async ({ body, request, response }) => {
      const person = await prove(request, response)
      return hand(response, await signIn(context, person, body.device), context)
    },
    [ownOrigin, throttles.byAddress, throttles.byAccount],
  )

  mount(
    router,
    endpoints.refreshSession,
    async ({ body, request, response }) => {
      const presented = readRefreshCookie(request, config)
      if (presented === undefined) throw notSignedIn()
      try {
        return hand(response, await rotateSession(context, presented, body.rotationId), context)
      } catch (error) {
        if (error instanceof Refusal && error.status === 401) clearRefreshCookie(response, config)
        throw error
      }
    },
    [ownOrigin, throttles.ofRefresh],
  )

  mount(
    router,
    endpoints.signOut,
    async ({ request, response }) => {
      const presented = readRefreshCookie(request, config)
      if (presented !== undefined) await endSession(context, presented)
      clearRefreshCookie(response, config)
      return {}
    },
    [ownOrigin],
  )

  mount(router, endpoints.readAccount, async ({ signedIn }) => {
    const { sessionId: _sessionId, deviceId: _deviceId, ...account } = signedIn
    return account
  })
}

function mountLinks(router: Router, context: Context, throttles: AuthThrottles): void {
  mount(
    router,
    endpoints.askPasswordReset,
    async ({ body }) => {
      // Answered before the address is looked up: neither the answer nor its time tells whether it is known.
      askPasswordReset(context, body.email).catch((error: unknown) =>
        context.log.error({ fault: describeFault(error) }, 'reset link was not sent'),
      )
      return {}
    },
    [throttles.byAddress, throttles.ofResets],
  )

  mount(
    router,
    endpoints.confirmPasswordReset,
    async ({ body }) => {
      await setPassword(context, body.token, body.password)
      return {}
    },
    [throttles.byAddress],
  )

  mount(router, endpoints.readInvitation, ({ params }) => readInvitation(context, params.token), [throttles.byAddress])

  mount(
    router,
    endpoints.acceptInvitation,
    async ({ params, body, response }) => hand(response, await acceptInvitation(context, params.token, body), context),
    [requireOwnOrigin(context.config), throttles.byAddress],
  )
}

function hand(response: Response, { session, refreshToken, cookieLastsMs }: OpenedSession, { config }: Context) {
  setRefreshCookie(response, refreshToken, cookieLastsMs, config)
  return session
}
