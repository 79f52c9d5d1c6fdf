import { createHmac } from 'node:crypto'
import jwt from 'jsonwebtoken'

/** Life of an access token. Refreshing is cheap, so a stolen one is soon worthless. */
export const ACCESS_TOKEN_S = 600
export const ACCESS_TOKEN_TYPE = 'at+jwt'
export const ACCESS_TOKEN_ISSUER = 'tallystone'
export const ACCESS_TOKEN_AUDIENCE = 'tallystone-api'
/** The only algorithm that is made or accepted. */
export const ACCESS_TOKEN_ALGORITHM = 'HS256'

/** What an access token says: who, in which session, on which device. Roles are never in it. */
export interface AccessClaims {
  readonly personId: string
  readonly organisationId: string
  readonly sessionId: string
  readonly deviceId: string
}

/** Key of one purpose, drawn from the server's secret, so that no signature serves two purposes. */
export function keyFor(purpose: string, sessionSecret: string): Buffer {
  return createHmac('sha256', sessionSecret).update(`tallystone:${purpose}`).digest()
}

/** Signs an access token that is good for {@link ACCESS_TOKEN_S} seconds from `now`. */
export function signAccessToken(claims: AccessClaims, sessionSecret: string, now: Date): string {
  const issuedAtS = Math.floor(now.getTime() / 1000)
  return jwt.sign(
    {
      iss: ACCESS_TOKEN_ISSUER,
      aud: ACCESS_TOKEN_AUDIENCE,
      sub: claims.personId,
      sid: claims.sessionId,
      organisation: claims.organisationId,
      device: claims.deviceId,
      iat: issuedAtS,
      nbf: issuedAtS,
      exp: issuedAtS + ACCESS_TOKEN_S,
    },
    keyFor('access-token', sessionSecret),
    { algorithm: ACCESS_TOKEN_ALGORITHM, header: { alg: ACCESS_TOKEN_ALGORITHM, typ: ACCESS_TOKEN_TYPE } },
  )
}
