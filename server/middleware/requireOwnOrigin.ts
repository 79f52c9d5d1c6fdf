import type { Request, RequestHandler } from 'express'
import type { Config } from '@/server/config'
import { Refusal } from '@/server/errors'

/**
 * Guards the addresses that act on a cookie: a page of another site is refused even where a browser would send the
 * cookie along. A request without both headers comes from no browser and carries nobody's cookie but its own.
 */
export function requireOwnOrigin(config: Pick<Config, 'publicUrl' | 'environment'>): RequestHandler {
  return (request, _response, next) => {
    next(isOwn(request, config) ? undefined : otherOrigin())
  }
}

function isOwn(request: Request, { publicUrl, environment }: Pick<Config, 'publicUrl' | 'environment'>): boolean {
  const origin = request.get('origin')
  if (origin === undefined) return ['same-origin', 'none', undefined].includes(request.get('sec-fetch-site'))
  if (origin === new URL(publicUrl).origin) return true
  const asked = URL.canParse(origin) ? new URL(origin) : undefined
  if (asked === undefined) return false
  if (asked.host === request.get('host') && isLoopback(asked.hostname)) return true
  // In development the page comes from Metro's own port, which passes /api on.
  return environment === 'development' && isLoopback(asked.hostname)
}

function isLoopback(hostname: string): boolean {
  return hostname === 'localhost' || hostname === '127.0.0.1' || hostname === '[::1]'
}

const otherOrigin = () =>
  new Refusal(403, 'other-origin', 'This request came from another site and was refused. Nothing was changed.')
