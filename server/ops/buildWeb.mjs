import { copyFileSync, existsSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { fingerprint, isFresh, writeStamp } from './fingerprint.mjs'
import { places, ROOT } from './places.mjs'
import { precompress } from './precompress.mjs'
import { run } from './run.mjs'

const INPUTS = [
  'app',
  'components',
  'db',
  'sync',
  'shared',
  'assets',
  'public',
  'app.json',
  'metro.config.js',
  'package-lock.json',
  'tsconfig.json',
  'server/ops/buildWeb.mjs',
]
const MAX_PRECACHED_BYTES = 5e6

/**
 * Exports the app for browsers into `.build/web`: bundles, the worker that serves it without network,
 * and compressed siblings. What was there before stays until the new one is whole.
 *
 * @param {{ isForced?: boolean, log?: (text: string) => void }} options
 * @returns {Promise<boolean>} false when it was fresh already
 */
export async function buildWeb({ isForced = false, log } = {}) {
  copyMapWorker()
  const stamp = path.join(places.build, 'web.stamp')
  const print = fingerprint(ROOT, INPUTS)
  if (!isForced && isFresh(stamp, print) && existsSync(path.join(places.web, 'index.html'))) return false
  const draft = `${places.web}.new`
  rmSync(draft, { recursive: true, force: true })
  await run(path.join(places.modules, '.bin', 'expo'), ['export', '--platform', 'web', '--output-dir', draft], {
    cwd: ROOT,
    env: { CI: '1', EXPO_OFFLINE: '1', EXPO_NO_TELEMETRY: '1', EXPO_NO_TYPESCRIPT_SETUP: '1', NODE_ENV: 'production' },
    log,
  })
  addRegistration(path.join(draft, 'index.html'))
  rmSync(path.join(draft, 'metadata.json'), { force: true })
  await writeServiceWorker(draft)
  await precompress(draft)
  rmSync(stamp, { force: true })
  rmSync(places.web, { recursive: true, force: true })
  renameSync(draft, places.web)
  writeStamp(stamp, print)
  return true
}

/** The map draws in a worker, which a browser loads from an address of its own. */
export function copyMapWorker() {
  const source = path.join(places.modules, 'maplibre-gl', 'dist', 'maplibre-gl-worker.mjs')
  copyFileSync(source, path.join(ROOT, 'public', 'maplibre-gl-worker.mjs'))
}

/** Only the exported page registers the worker; a page from Metro must stay without one. */
function addRegistration(pageFile) {
  const page = readFileSync(pageFile, 'utf8')
  writeFileSync(
    pageFile,
    page.replace('</head>', '  <script src="/register-service-worker.js" defer></script>\n  </head>'),
  )
}

async function writeServiceWorker(folder) {
  const { generateSW } = await import('workbox-build')
  const { warnings } = await generateSW({
    globDirectory: folder,
    swDest: path.join(folder, 'service-worker.js'),
    globPatterns: ['**/*.{html,js,mjs,css,json,wasm,ttf,otf,woff2,svg,png,jpg,webp,webmanifest}'],
    // Not the default, which leaves out node_modules, where the export keeps fonts and SQLite.
    globIgnores: ['**/*.map', 'service-worker.js'],
    maximumFileSizeToCacheInBytes: MAX_PRECACHED_BYTES,
    dontCacheBustURLsMatching: /[.-][0-9a-f]{32}\./,
    navigateFallback: '/index.html',
    navigateFallbackDenylist: [/^\/api\//, /^\/dev\//],
    // A new version waits until the person agrees or all tabs are closed; the first one serves the open page at once.
    skipWaiting: false,
    clientsClaim: true,
    cleanupOutdatedCaches: true,
    cacheId: 'tallystone',
    inlineWorkboxRuntime: true,
    sourcemap: false,
    mode: 'production',
  })
  if (warnings.length > 0) throw new Error(`The app would not be whole without network:\n${warnings.join('\n')}`)
}
