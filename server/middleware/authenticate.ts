import type { RequestHandler } from 'express'
import { Passport } from 'passport'
import { ExtractJwt, Strategy as JwtStrategy } from 'passport-jwt'
import { z } from 'zod'
import type { Context } from '@/server/context'
import { Refusal } from '@/server/errors'
import { readSignedIn } from '@/server/queries/readSignedIn'
import {
  ACCESS_TOKEN_ALGORITHM,
  ACCESS_TOKEN_AUDIENCE,
  ACCESS_TOKEN_ISSUER,
  ACCESS_TOKEN_TYPE,
  keyFor,
} from './accessToken'
import type { SignedIn } from './signedIn'

const CLOCK_TOLERANCE_S = 5

const verifiedToken = z.object({
  header: z.object({ alg: z.literal(ACCESS_TOKEN_ALGORITHM), typ: z.literal(ACCESS_TOKEN_TYPE) }),
  payload: z.object({
    sub: z.uuid(),
    sid: z.uuid(),
    organisation: z.uuid(),
    device: z.uuid(),
    nbf: z.number(),
    exp: z.number(),
  }),
})

/**
 * Reads the bearer token, if there is one, and puts the person behind it on the request.
 * Roles, status, session and device come from the database at every request. A token that is not good leaves the
 * request unsigned (each endpoint then refuses it); a disabled person and a revoked device are told so.
 */
export function authenticate(context: Context): RequestHandler {
  const passport = new Passport()
  passport.use(accessTokenStrategy(context))
  return (request, response, next) => {
    if (request.headers.authorization === undefined || request.path.startsWith('/auth/')) return next()
    const onVerdict = (error: unknown, person: SignedIn | false | null | undefined) => {
      if (error) return next(error)
      if (person) request.signedIn = person
      next()
    }
    passport.authenticate('jwt', { session: false }, onVerdict)(request, response, next)
  }
}

function accessTokenStrategy({ config, database, now }: Context): JwtStrategy {
  return new JwtStrategy(
    {
      jwtFromRequest: ExtractJwt.fromAuthHeaderAsBearerToken(),
      secretOrKey: keyFor('access-token', config.sessionSecret),
      algorithms: [ACCESS_TOKEN_ALGORITHM],
      issuer: ACCESS_TOKEN_ISSUER,
      audience: ACCESS_TOKEN_AUDIENCE,
      // The server's own clock judges the times below; the library would read the machine's.
      ignoreExpiration: true,
      jsonWebTokenOptions: { complete: true, ignoreNotBefore: true },
    },
    (token: unknown, done: (error: unknown, person?: SignedIn | false) => void) => {
      const parsed = verifiedToken.safeParse(token)
      if (!parsed.success) return done(null, false)
      const { sub, sid, organisation, device, nbf, exp } = parsed.data.payload
      const nowS = now().getTime() / 1000
      if (nowS >= exp || nowS + CLOCK_TOLERANCE_S < nbf) return done(null, false)
      readSignedIn(database, { personId: sub, sessionId: sid, organisationId: organisation, deviceId: device }).then(
        (found) => {
          if (found === 'ended') return done(null, false)
          if (found === 'device-revoked') return done(deviceRevoked())
          if (found === 'account-disabled') return done(accountDisabled())
          done(null, found)
        },
        (error: unknown) => done(error),
      )
    },
  )
}

export const deviceRevoked = () =>
  new Refusal(
    403,
    'device-revoked',
    'A steward has shut this device out. What it holds stays on it; ask your steward how to hand it in.',
  )
export const accountDisabled = () =>
  new Refusal(
    403,
    'account-disabled',
    'This account is shut. What is kept on this device is safe; ask your steward to open the account again.',
  )
