/** Work that outlives a request. Names and payloads are listed here once. */
export interface JobPayloads {
  'compute-run': { organisationId: string; personId: string; runId: string }
  'send-mail': { to: string; subject: string; text: string; html: string }
  /** Makes a one-time link and mails it; the link itself never lies in the queue. */
  'send-link': { organisationId: string; personId: string; purpose: 'invitation' | 'password-reset' }
}
export type JobName = keyof JobPayloads
export const JOB_NAMES = ['compute-run', 'send-mail', 'send-link'] as const satisfies readonly JobName[]

export interface Queue {
  send<Name extends JobName>(name: Name, payload: JobPayloads[Name]): Promise<void>
  work<Name extends JobName>(name: Name, handler: (payload: JobPayloads[Name]) => Promise<void>): Promise<void>
  isReady(): Promise<boolean>
  /** Waits for running jobs, then stops. */
  stop(): Promise<void>
}
