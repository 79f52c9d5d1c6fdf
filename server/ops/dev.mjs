import path from 'node:path'
import { buildServer } from './buildServer.mjs'
import { copyMapWorker } from './buildWeb.mjs'
import { makeClosers } from './closers.mjs'
import { runServerCommand } from './commandLine.mjs'
import { places, ROOT } from './places.mjs'
import { prepareMachine } from './prepareMachine.mjs'
import { endRunning } from './run.mjs'
import { say, step } from './say.mjs'
import { startProcess } from './serveProcess.mjs'
import { hasOwnDatabase, openDatabaseAndSettings, readPort } from './serverSettings.mjs'

/** `npm run dev`: the server and the bundler, both reloading; the app at METRO_PORT, which passes /api on. */
const METRO_PORT = process.env.METRO_PORT ?? '8081'
const closers = makeClosers()
let isStopping = false

async function stopAll(exitCode) {
  if (isStopping) return
  isStopping = true
  endRunning()
  await closers.closeAll()
  process.exit(exitCode)
}

closers.onSignal(() => void stopAll(0))

try {
  await develop()
} catch (error) {
  if (!isStopping) console.error(`\n${error.message}`)
  await stopAll(1)
}

async function develop() {
  const port = readPort()
  await prepareMachine(hasOwnDatabase() ? [] : ['database'])
  copyMapWorker()
  const opening = openDatabaseAndSettings({ port })
  closers.add(async () => (await opening.catch(() => undefined))?.stop())
  const { environment } = await step('Starting the database', () => opening)
  await step('Building the command line', () => buildServer())
  await step('Preparing the tables', async () => {
    await runServerCommand('migrate', environment)
    await runServerCommand('seed-demo', environment)
  })
  const address = `http://127.0.0.1:${METRO_PORT}`
  const bin = (name) => path.join(places.modules, '.bin', name)
  const server = await startProcess({
    args: [bin('tsx'), 'watch', '--clear-screen=false', 'server/main.ts'],
    cwd: ROOT,
    env: { PUBLIC_URL: address, ...environment },
    readyUrl: `http://127.0.0.1:${port}/api/ready`,
  })
  closers.add(server.stop)
  const metro = await startProcess({
    args: [bin('expo'), 'start', '--web', '--offline', '--port', METRO_PORT],
    cwd: ROOT,
    env: {
      ...process.env,
      EXPO_NO_TELEMETRY: '1',
      EXPO_NO_TYPESCRIPT_SETUP: '1',
      BROWSER: 'none',
      API_ADDRESS: `http://127.0.0.1:${port}`,
    },
    readyUrl: `${address}/status`,
  })
  closers.add(metro.stop)
  say(`\nThe app: ${address} (it reloads; /api is passed on to port ${port})\nCtrl-C stops all.\n`)
  await Promise.race([server.ended, metro.ended])
  if (!isStopping) throw new Error('One of the two ended; stopping the other.')
}
