const http = require('node:http')
const path = require('node:path')
const { getDefaultConfig } = require('expo/metro-config')

const config = getDefaultConfig(__dirname)
const { resolver, server } = config

// SQLite in the browser is WebAssembly.
resolver.assetExts.push('wasm')

const outside = ['server', 'tests', '.build', '.local', 'test-results', 'playwright-report']
const here = escaped(__dirname + path.sep)
resolver.blockList = [
  ...[resolver.blockList ?? []].flat(),
  new RegExp(`^${here}(?:${outside.map(escaped).join('|')})[/\\\\].*$`),
  new RegExp(`^${here}(?!node_modules[/\\\\]).*\\.test\\.(?:ts|tsx)$`),
]

/** zod brings the words of forty languages along; ours are in the message catalogue. */
const ZOD_LOCALES = /(?:^|\/)locales\/index(?:\.c?js)?$/
const inZod = `${path.sep}node_modules${path.sep}zod${path.sep}`
const resolveAsBefore = resolver.resolveRequest
resolver.resolveRequest = (context, moduleName, platform) => {
  if (context.originModulePath.includes(inZod) && ZOD_LOCALES.test(moduleName)) return { type: 'empty' }
  return (resolveAsBefore ?? context.resolveRequest)(context, moduleName, platform)
}

// While developing, the app comes from Metro and the rest from the server, both at one address.
const API_ADDRESS = process.env.API_ADDRESS ?? 'http://127.0.0.1:8080'
const enhanceAsBefore = server.enhanceMiddleware
server.enhanceMiddleware = (middleware, metro) => {
  const next = enhanceAsBefore ? enhanceAsBefore(middleware, metro) : middleware
  return (request, response, done) =>
    /^\/(?:api|dev)\//.test(request.url) ? passOn(request, response) : next(request, response, done)
}

function passOn(request, response) {
  const target = new URL(request.url, API_ADDRESS)
  const outgoing = http.request(target, { method: request.method, headers: request.headers }, (incoming) => {
    response.writeHead(incoming.statusCode ?? 502, incoming.headers)
    incoming.pipe(response)
  })
  outgoing.once('error', () => {
    if (!response.headersSent) response.writeHead(503, { 'Content-Type': 'text/plain' })
    response.end('The server is not up yet, or is restarting.\n')
  })
  response.once('close', () => outgoing.destroy())
  request.pipe(outgoing)
}

function escaped(text) {
  return text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&')
}

module.exports = config
