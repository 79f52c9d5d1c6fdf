import type { CookieOptions, Request, Response } from 'express'
import type { Config } from '@/server/config'
import { isHttps } from '@/server/middleware/securityHeaders'

const DAY_MS = 86_400_000
/** A session ends when it was not used for so long … */
export const SESSION_IDLE_MS = 30 * DAY_MS
/** … and in any case after this: one season of survey. */
export const SESSION_ABSOLUTE_MS = 180 * DAY_MS

/** Name of the cookie; by https the browser itself guards the prefix `__Host-`. */
export function refreshCookieName(config: Pick<Config, 'publicUrl'>): string {
  return isHttps(config.publicUrl) ? '__Host-tallystone-refresh' : 'tallystone-refresh'
}

export function readRefreshCookie(request: Request, config: Config): string | undefined {
  const value: unknown = (request.cookies as Record<string, unknown> | undefined)?.[refreshCookieName(config)]
  return typeof value === 'string' && value.length > 0 ? value : undefined
}

export function setRefreshCookie(response: Response, token: string, lastsMs: number, config: Config): void {
  response.cookie(refreshCookieName(config), token, { ...cookieOptions(config), maxAge: lastsMs })
}

export function clearRefreshCookie(response: Response, config: Config): void {
  response.clearCookie(refreshCookieName(config), cookieOptions(config))
}

function cookieOptions(config: Config): CookieOptions {
  return { httpOnly: true, sameSite: 'strict', path: '/', secure: isHttps(config.publicUrl) }
}
