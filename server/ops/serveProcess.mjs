import { spawn } from 'node:child_process'
import { track } from './run.mjs'

const POLL_MS = 100

/**
 * Starts a process that serves HTTP and waits until it says it is ready.
 *
 * @param {object} options
 * @param {string[]} options.args after `node`
 * @param {string} options.readyUrl answers 200 when all is ready
 * @param {number} [options.timeoutMs]
 * @returns {Promise<{ stop(): Promise<void>, ended: Promise<number | null> }>} `ended` is its exit code
 * @throws {Error} when it ends, or is not ready in time
 */
export async function startProcess({ args, cwd, env, readyUrl, stdio = 'inherit', timeoutMs = 60_000 }) {
  const child = spawn(process.execPath, args, { cwd, env, stdio })
  track(child)
  let exitCode
  const ended = new Promise((resolve) => {
    child.once('error', () => resolve((exitCode = 1)))
    child.once('exit', (code) => resolve((exitCode = code ?? 1)))
  })
  const stop = async () => {
    if (exitCode === undefined) child.kill('SIGTERM')
    await ended
  }
  const giveUpMs = performance.now() + timeoutMs
  while (!(await answers(readyUrl))) {
    if (exitCode !== undefined) throw new Error(`The server ended with ${exitCode} before it was ready.`)
    if (performance.now() > giveUpMs) {
      await stop()
      throw new Error(`The server was not ready within ${timeoutMs / 1_000} s.`)
    }
    await new Promise((resolve) => setTimeout(resolve, POLL_MS))
  }
  return { stop, ended }
}

async function answers(url) {
  try {
    return (await fetch(url, { signal: AbortSignal.timeout(5_000) })).ok
  } catch {
    return false
  }
}
