import { isDiskFull } from '@/db/isDiskFull'
import { ApiError, UnreachableError } from './api/ApiError'
import type { HandInState } from './handIn.types'

/** Why handing in stopped, in the few kinds that a person can do something about. */
export function whyStopped(error: unknown): NonNullable<HandInState['stoppedBecause']> {
  if (error instanceof UnreachableError) return 'no-network'
  if (error instanceof ApiError) {
    if (error.status === 401) return 'sign-in-again'
    if (error.status === 403) return 'device-revoked'
    if (error.status === 426) return 'upgrade-required'
    return 'server-fault'
  }
  return isDiskFull(error) ? 'device-full' : 'server-fault'
}

/** Reasons that time alone does not mend: trying again waits for the person. */
export function needsPerson(reason: HandInState['stoppedBecause']): boolean {
  return (
    reason === 'sign-in-again' ||
    reason === 'device-revoked' ||
    reason === 'surrendered' ||
    reason === 'upgrade-required'
  )
}
