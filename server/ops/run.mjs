import { spawn, spawnSync } from 'node:child_process'

/** A command of another program ended badly; the message carries what it said. */
export class CommandError extends Error {
  name = 'CommandError'
  constructor(command, exitCode, output) {
    super(`"${command}" ended with ${exitCode ?? 'a signal'}${output ? `:\n${tail(output)}` : '.'}`)
    this.exitCode = exitCode
    this.output = output
  }
}

/** Programs that run now. */
const running = new Set()

/** Counts a program among those that {@link endRunning} ends. */
export function track(child) {
  running.add(child)
  child.once('close', () => running.delete(child))
}

/** Ends what was started and has not ended; for when we are told to stop. */
export function endRunning() {
  for (const child of running) child.kill('SIGTERM')
}

/**
 * Runs a program to its end and gives back what it said.
 *
 * @param {string} program
 * @param {readonly string[]} args
 * @param {{ cwd?: string, env?: Record<string, string | undefined>, input?: string, log?: (text: string) => void }} options
 *   `input` goes to its standard input; `log` receives every piece of output as it comes
 * @returns {Promise<string>} standard output
 * @throws {CommandError}
 */
export function run(program, args, { cwd, env, input, log } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, {
      cwd,
      env: { ...process.env, ...env },
      stdio: [input === undefined ? 'ignore' : 'pipe', 'pipe', 'pipe'],
    })
    track(child)
    let output = ''
    let everything = ''
    const take = (isOutput) => (chunk) => {
      const text = chunk.toString('utf8')
      if (isOutput) output += text
      everything += text
      log?.(text)
    }
    child.stdout.on('data', take(true))
    child.stderr.on('data', take(false))
    child.once('error', (error) => reject(new CommandError(program, undefined, error.message)))
    child.once('close', (code) => {
      if (code === 0) resolve(output)
      else reject(new CommandError([program, ...args].join(' '), code, everything))
    })
    if (input !== undefined) {
      child.stdin.on('error', () => {})
      child.stdin.end(input)
    }
  })
}

/** Whether a program can be found on the path. */
export function hasProgram(name) {
  return spawnSync('sh', ['-c', `command -v "$1" >/dev/null 2>&1`, 'sh', name]).status === 0
}

function tail(text, lines = 25) {
  return text.trim().split('\n').slice(-lines).join('\n')
}
