import { readdirSync } from 'node:fs'
import path from 'node:path'
import type { Request, RequestHandler, Response } from 'express'
import type { Context } from '@/server/context'
import { notFound } from '@/server/errors'

const ENCODINGS = [
  { name: 'br', extension: '.br' },
  { name: 'gzip', extension: '.gz' },
] as const
/** Folders in which every name bears a digest of its content. */
const HASHED = /^\/(?:_expo\/static|assets)\//
const START_PAGE = '/index.html'

/**
 * Serves the exported app: the smallest form the browser takes, files with a digest in their name for ever,
 * everything else asked for anew. Addresses of screens answer the start page. Only names that were in the folder
 * at start are served, so no address can lead out of it. Without a web root every address is unknown.
 */
export function serveWeb({ config: { webRoot } }: Pick<Context, 'config'>): RequestHandler {
  const files = webRoot === undefined ? new Set<string>() : listFiles(webRoot)
  return (request, response, next) => {
    if (webRoot === undefined || (request.method !== 'GET' && request.method !== 'HEAD'))
      return next(notFound('address'))
    const name = fileFor(request, files)
    if (name === undefined) return next(notFound('address'))
    sendSmallest(request, response, { webRoot, name, files }, next)
  }
}

function listFiles(root: string): Set<string> {
  try {
    const entries = readdirSync(root, { recursive: true, withFileTypes: true })
    return new Set(
      entries
        .filter((entry) => entry.isFile())
        .map((entry) => `/${path.relative(root, path.join(entry.parentPath, entry.name)).split(path.sep).join('/')}`),
    )
  } catch {
    return new Set()
  }
}

function fileFor(request: Request, files: ReadonlySet<string>): string | undefined {
  const name = decoded(request.path)
  if (name === undefined) return undefined
  if (files.has(name) && name !== '/') return name
  const wantsPage = (request.headers.accept ?? '').includes('text/html') || name === '/'
  return wantsPage && files.has(START_PAGE) ? START_PAGE : undefined
}

function decoded(address: string): string | undefined {
  try {
    return decodeURIComponent(address)
  } catch {
    return undefined
  }
}

function sendSmallest(
  request: Request,
  response: Response,
  { webRoot, name, files }: { webRoot: string; name: string; files: ReadonlySet<string> },
  next: (error?: unknown) => void,
): void {
  const offered = ENCODINGS.filter(({ extension }) => files.has(name + extension))
  response.set('Cache-Control', HASHED.test(name) ? 'public, max-age=31536000, immutable' : 'no-cache')
  let chosen = ''
  if (offered.length > 0) {
    response.vary('Accept-Encoding')
    const accepted = request.acceptsEncodings(...offered.map((encoding) => encoding.name), 'identity')
    const encoding = offered.find((candidate) => candidate.name === accepted)
    if (encoding) {
      response.type(path.extname(name))
      response.set('Content-Encoding', encoding.name)
      chosen = encoding.extension
    }
  }
  response.sendFile(name.slice(1) + chosen, { root: webRoot, cacheControl: false, dotfiles: 'deny' }, (error) => {
    if (!error) return
    if (response.headersSent) return void response.destroy()
    response.removeHeader('Content-Encoding')
    next(notFound('address'))
  })
}
