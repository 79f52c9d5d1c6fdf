import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { brotliCompressSync, gzipSync } from 'node:zlib'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createApp } from '@/server/createApp'
import { createTestContext } from '@/tests/support/createTestContext'

const ENTRY = '/_expo/static/js/web/entry-0f3a.js'
let root: string
let http: ReturnType<typeof request>
beforeAll(() => {
  root = mkdtempSync(path.join(tmpdir(), 'web-'))
  const put = (name: string, content: string) => {
    mkdirSync(path.dirname(path.join(root, name)), { recursive: true })
    writeFileSync(path.join(root, name), content)
  }
  put('index.html', '<!doctype html><title>start</title>')
  put('sw.js', 'self.x = 1')
  put('assets/rows.wasm', 'wasm')
  put(ENTRY, 'const entry = 1')
  writeFileSync(path.join(root, `${ENTRY}.br`), brotliCompressSync('const entry = 1'))
  writeFileSync(path.join(root, `${ENTRY}.gz`), gzipSync('const entry = 1'))
  writeFileSync(path.join(path.dirname(root), `${path.basename(root)}-secret.txt`), 'secret')
  http = request(createApp(createTestContext('postgres://nobody@127.0.0.1:1/none', { config: { webRoot: root } })))
})
afterAll(() => {
  rmSync(root, { recursive: true })
  rmSync(path.join(path.dirname(root), `${path.basename(root)}-secret.txt`))
})

describe('the exported app', () => {
  it.each([
    ['br, gzip', 'br'],
    ['gzip;q=1, br;q=0.5', 'gzip'],
    ['gzip', 'gzip'],
    ['identity', undefined],
    ['br;q=0, gzip;q=0', undefined],
  ])('comes to a browser that takes "%s" as %s', async (accepted, expected) => {
    const answer = await http.get(ENTRY).set('Accept-Encoding', accepted)

    expect(answer.status).toBe(200)
    expect(answer.get('Content-Encoding')).toBe(expected)
    expect(answer.get('Vary')).toContain('Accept-Encoding')
    expect(answer.get('Content-Type')).toBe('text/javascript; charset=utf-8')
    expect(answer.get('Cache-Control')).toBe('public, max-age=31536000, immutable')
  })

  it('keeps hashed files for ever, and asks for pages and the worker anew', async () => {
    expect((await http.get('/assets/rows.wasm')).get('Cache-Control')).toContain('immutable')
    expect((await http.get('/assets/rows.wasm')).get('Content-Type')).toBe('application/wasm')
    for (const name of ['/', '/index.html', '/sw.js']) {
      const answer = await http.get(name)
      expect([answer.status, answer.get('Cache-Control')]).toEqual([200, 'no-cache'])
    }
    const etag = (await http.get('/sw.js')).get('ETag') ?? ''
    expect((await http.get('/sw.js').set('If-None-Match', etag)).status).toBe(304)
  })

  it('answers the start page at the address of a screen, and only where a page is asked for', async () => {
    const screen = await http.get('/sheets/0198').set('Accept', 'text/html,*/*;q=0.8')
    const script = await http.get('/_expo/static/js/web/gone.js').set('Accept', '*/*')

    expect(screen.text).toContain('<title>start</title>')
    expect([script.status, script.body.code]).toEqual([404, 'not-found'])
  })

  it('answers a problem below /api, never the start page', async () => {
    const answer = await http.get('/api/v1/nothing').set('Accept', 'text/html')

    expect([answer.status, answer.get('Content-Type'), answer.body.code]).toEqual([
      404,
      'application/problem+json; charset=utf-8',
      'not-found',
    ])
  })

  it('leads nowhere outside its folder', async () => {
    const secret = `${path.basename(root)}-secret.txt`
    for (const address of [
      `/../${secret}`,
      `/..%2f${secret}`,
      `/%2e%2e/${secret}`,
      '/%',
      `/assets/..%5c..%5c${secret}`,
    ]) {
      expect([
        address,
        (await http.get(address)).text.includes('secret\n') || (await http.get(address)).status,
      ]).toEqual([address, 404])
    }
    expect((await http.post('/index.html')).status).toBe(404)
  })

  it('is absent without a web root', async () => {
    const bare = request(createApp(createTestContext('postgres://nobody@127.0.0.1:1/none')))
    expect((await bare.get('/').set('Accept', 'text/html')).status).toBe(404)
  })
})

describe('headers', () => {
  it('say on pages, files, API and errors what may run', async () => {
    const csp =
      "default-src 'self';script-src 'self' 'wasm-unsafe-eval';worker-src 'self' blob:;img-src 'self' data: blob:;" +
      "style-src 'self' 'unsafe-inline';font-src 'self' data:;connect-src 'self' blob: data:;media-src 'self' blob:;" +
      "object-src 'none';base-uri 'self';frame-ancestors 'none'"
    for (const address of ['/', ENTRY, '/api/health', '/api/v1/nothing', '/nothing.js']) {
      const answer = await http.get(address)
      expect(answer.get('Content-Security-Policy')).toBe(csp)
      expect(answer.get('X-Content-Type-Options')).toBe('nosniff')
      expect(answer.get('Referrer-Policy')).toBe('no-referrer')
      expect(answer.get('X-Frame-Options')).toBe('DENY')
      expect(answer.get('X-Powered-By')).toBeUndefined()
      expect(answer.get('Strict-Transport-Security')).toBeUndefined()
    }
  })
})
