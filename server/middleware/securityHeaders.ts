import type { RequestHandler } from 'express'
import helmet from 'helmet'
import type { Config } from '@/server/config'

const YEAR_S = 31_536_000

/** What a page of ours may load and run: itself, the wasm of SQLite, and nothing from elsewhere. */
const contentSecurity = {
  'default-src': ["'self'"],
  'script-src': ["'self'", "'wasm-unsafe-eval'"],
  'worker-src': ["'self'", 'blob:'],
  'img-src': ["'self'", 'data:', 'blob:'],
  'style-src': ["'self'", "'unsafe-inline'"],
  'font-src': ["'self'", 'data:'],
  'connect-src': ["'self'", 'blob:', 'data:'],
  'media-src': ["'self'", 'blob:'],
  'object-src': ["'none'"],
  'base-uri': ["'self'"],
  'frame-ancestors': ["'none'"],
}

/** Headers of every answer, errors too. HSTS only where people come by https. */
export function securityHeaders(config: Config): RequestHandler {
  const withHelmet = helmet({
    contentSecurityPolicy: { useDefaults: false, directives: contentSecurity },
    strictTransportSecurity: isHttps(config.publicUrl) ? { maxAge: YEAR_S, includeSubDomains: false } : false,
    referrerPolicy: { policy: 'no-referrer' },
    xFrameOptions: { action: 'deny' },
  })
  return (request, response, next) => {
    response.set('Permissions-Policy', 'camera=(self), geolocation=(self), microphone=(), payment=(), usb=()')
    withHelmet(request, response, next)
  }
}

/** Whether people reach the product by https, so that cookies and headers may insist on it. */
export function isHttps(publicUrl: string): boolean {
  return publicUrl.startsWith('https:')
}
