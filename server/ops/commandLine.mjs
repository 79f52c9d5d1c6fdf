import path from 'node:path'
import { places, ROOT } from './places.mjs'
import { run } from './run.mjs'

/**
 * Runs a command of the built server, e.g. `migrate`.
 *
 * @returns {Promise<unknown>} what its last line of output holds as JSON, or undefined
 * @throws {Error} with what the command said
 */
export async function runServerCommand(command, environment, words = []) {
  const args = ['--enable-source-maps', path.join(places.server, 'cli.mjs'), command, ...words]
  const output = await run(process.execPath, args, { cwd: ROOT, env: environment }).catch((error) => {
    throw new Error(error.output?.trim() || error.message)
  })
  try {
    return JSON.parse(output.trim().split('\n').at(-1) ?? '')
  } catch {
    return undefined
  }
}
