import { buildServer } from './buildServer.mjs'
import { buildWeb } from './buildWeb.mjs'

/** `npm run build [-- --force] [-- web|server]`: makes `.build/web` and `.build/server`, where something changed. */
const words = process.argv.slice(2)
const isForced = words.includes('--force')
const parts = words.filter((word) => !word.startsWith('--'))
const unknown = parts.filter((part) => part !== 'web' && part !== 'server')
const wants = (part) => parts.length === 0 || parts.includes(part)

try {
  if (unknown.length > 0) throw new Error(`"${unknown[0]}" is not a part of the build: say web, server or nothing.`)
  if (wants('server')) report('Server', await timed(() => buildServer({ isForced })))
  if (wants('web')) report('App', await timed(() => buildWeb({ isForced, log: (text) => process.stdout.write(text) })))
} catch (error) {
  console.error(error.message)
  process.exitCode = 1
}

async function timed(work) {
  const startMs = performance.now()
  const isNew = await work()
  return { isNew, seconds: (performance.now() - startMs) / 1_000 }
}

function report(part, { isNew, seconds }) {
  console.log(isNew ? `${part} built in ${seconds.toFixed(1)} s.` : `${part}: nothing changed.`)
}
