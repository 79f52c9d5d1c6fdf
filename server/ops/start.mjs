import path from 'node:path'
import { buildServer } from './buildServer.mjs'
import { buildWeb } from './buildWeb.mjs'
import { makeClosers } from './closers.mjs'
import { runServerCommand } from './commandLine.mjs'
import { tryPort } from './freePort.mjs'
import { places, ROOT } from './places.mjs'
import { prepareMachine } from './prepareMachine.mjs'
import { endRunning } from './run.mjs'
import { say, step } from './say.mjs'
import { hasOwnDatabase, openDatabaseAndSettings, readPort } from './serverSettings.mjs'
import { startProcess } from './serveProcess.mjs'

/**
 * `npm start`: from a bare checkout to a served product, with the demo.
 * `npm start -- --empty [--organisation NAME] [--name NAME] [--email ADDRESS]`: without it, for one's own organisation.
 */
const closers = makeClosers()
let isStopping = false

closers.onSignal(() => {
  if (isStopping) return
  isStopping = true
  say('\nStopping …')
  endRunning()
  void closers.closeAll().then(() => {
    say('Stopped. Everything is kept; npm start goes on where you left.')
    process.exit(0)
  })
})

try {
  await start()
} catch (error) {
  if (!isStopping) {
    isStopping = true
    console.error(`\n${error.message}`)
    endRunning()
    await closers.closeAll()
    process.exit(1)
  }
}

async function start() {
  const command = readArguments(process.argv.slice(2))
  const port = readPort()
  await refuseTakenPort(port, process.env.HOST)
  await prepareMachine(hasOwnDatabase() ? [] : ['database'])
  const opening = openDatabaseAndSettings({ port })
  closers.add(async () => (await opening.catch(() => undefined))?.stop())
  const { environment } = await step('Starting the database', () => opening)
  await step('Building the server', () => buildServer())
  const [accounts] = await Promise.all([
    step('Preparing the tables', () => fill(environment, command)),
    step('Building the app (about a minute when something changed)', () => buildWeb()),
  ])
  if (isStopping) return
  const server = await startProcess({
    args: ['--enable-source-maps', path.join(places.server, 'main.mjs')],
    cwd: ROOT,
    env: { LOG_LEVEL: 'warn', ...environment },
    readyUrl: `${localAddress(environment)}/api/ready`,
  })
  closers.add(server.stop)
  welcome(environment, accounts)
  const exitCode = await server.ended
  if (isStopping) return
  throw new Error(`The server ended by itself (${exitCode}). What it wrote stands above.`)
}

/** @returns {string[]} the command of the server that fills an empty database */
function readArguments(words) {
  const [first, ...steward] = words
  if (first === undefined) return ['seed-demo']
  const known = /^--(?:organisation|name|email)(?:=|$)/
  const unknown = first === '--empty' ? steward.find((word) => word.startsWith('--') && !known.test(word)) : first
  if (unknown === undefined) return ['first-steward', ...steward]
  throw new Error(
    `"${unknown}" is not known. npm start takes nothing, or -- --empty, and after that --organisation, --name and ` +
      '--email of the first steward. Nothing was started.',
  )
}

async function refuseTakenPort(port, host) {
  if ((await tryPort(port, host)) !== undefined) return
  throw new Error(
    `Port ${port} is taken by another program, or may not be used. Nothing was started.\n` +
      `Stop that program, or choose another port: PORT=${port + 10} npm start`,
  )
}

/** @returns {Promise<{ accounts?: readonly object[], link?: string, email?: string }>} */
async function fill(environment, [command, ...words]) {
  await runServerCommand('migrate', environment)
  return (await runServerCommand(command, environment, words)) ?? {}
}

function localAddress({ HOST, PORT }) {
  const host = HOST === '0.0.0.0' || HOST === '::' ? '127.0.0.1' : HOST
  return `http://${host.includes(':') ? `[${host}]` : host}:${PORT}`
}

function welcome(environment, { accounts = [], link, email }) {
  const address = environment.PUBLIC_URL ?? localAddress(environment)
  say(`\nTallystone is up: ${address}`)
  if (link) {
    say(`\nThe first steward opens this link to choose a password:\n  ${link}`)
    say(`and signs in as ${email} from then on.`)
  }
  if (accounts.length > 0) {
    say('\nThe demo, Saltmarsh Hythe, is invented. Its accounts:')
    for (const line of table(accounts, ['role', 'name', 'email', 'password'])) say(`  ${line}`)
  }
  if (environment.DEV_MAIL === 'true') say(`\nMessages that would be e-mailed: ${address}/dev/mail`)
  say('\nCtrl-C stops it.\n')
}

function table(rows, columns) {
  const lines = [columns, ...rows.map((row) => columns.map((column) => String(row[column] ?? '')))]
  const widths = columns.map((_, index) => Math.max(...lines.map((line) => line[index].length)))
  return lines.map((line) =>
    line
      .map((cell, index) => cell.padEnd(widths[index]))
      .join('  ')
      .trimEnd(),
  )
}
