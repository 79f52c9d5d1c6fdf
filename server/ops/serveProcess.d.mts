import type { StdioOptions } from 'node:child_process'

export interface StartedProcess {
  stop(): Promise<void>
  /** Its exit code. */
  readonly ended: Promise<number>
}

export function startProcess(options: {
  readonly args: readonly string[]
  readonly cwd: string
  readonly env: NodeJS.ProcessEnv
  readonly readyUrl: string
  readonly stdio?: StdioOptions
  readonly timeoutMs?: number
}): Promise<StartedProcess>
