import type { Request, RequestHandler } from 'express'
import { ipKeyGenerator, rateLimit, type AugmentedRequest } from 'express-rate-limit'
import { Refusal } from '@/server/errors'

const MINUTE_MS = 60_000

/** At most `perMinute` requests a minute from one address. */
export function throttleByAddress(perMinute: number): RequestHandler {
  return limiter({ windowMs: MINUTE_MS, limit: perMinute, keyGenerator: (request) => ipKeyGenerator(request.ip ?? '') })
}

/**
 * At most `limit` requests in `windowMs` under one key of the request's own content.
 *
 * @param options.countsFailuresOnly whether an answer of success gives its place back
 */
export function throttleByKey(options: {
  windowMs: number
  limit: number
  key: (request: Request) => string | Promise<string>
  countsFailuresOnly?: boolean
}): RequestHandler {
  return limiter({
    windowMs: options.windowMs,
    limit: options.limit,
    keyGenerator: options.key,
    skipSuccessfulRequests: options.countsFailuresOnly ?? false,
  })
}

/** The address somebody typed, as far as it is one, for counting only. */
export function typedEmail(request: Request): string {
  const { email } = (request.body ?? {}) as { email?: unknown }
  return typeof email === 'string' ? email.trim().toLowerCase().slice(0, 254) : ''
}

function limiter(options: {
  windowMs: number
  limit: number
  keyGenerator: (request: Request) => string | Promise<string>
  skipSuccessfulRequests?: boolean
}): RequestHandler {
  return rateLimit({
    ...options,
    legacyHeaders: false,
    standardHeaders: false,
    // A header that the configured proxies did not set is ignored on purpose, not by mistake.
    validate: { xForwardedForHeader: false },
    handler: (request, _response, next) => next(tooMany((request as AugmentedRequest).rateLimit?.resetTime)),
  })
}

function tooMany(resetTime: Date | undefined): Refusal {
  const waitS = Math.max(1, Math.ceil(((resetTime?.getTime() ?? 0) - new Date().getTime()) / 1000))
  return new Refusal(
    429,
    'too-many-attempts',
    `Too many attempts. Nothing was changed; try again in ${waitS < 90 ? `${waitS} seconds` : `${Math.ceil(waitS / 60)} minutes`}.`,
    [],
    { 'Retry-After': String(waitS) },
  )
}
