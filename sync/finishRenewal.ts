import { renewDevice } from '@/shared/api/sync'
import type { SyncStore } from '@/db/syncStore.types'
import type { ApiClient } from './api/createApiClient'

export interface RenewalParts {
  readonly store: SyncStore
  readonly api: ApiClient
  readonly deviceId: () => string
  readonly deviceName: string
  /** The session goes on with this token under the new device id. */
  readonly adoptToken: (accessToken: string) => void
}

/**
 * Ends a renewal of the device id that was begun, or broke off: the session goes on under the new id and the bag is
 * numbered from 1 (P4). Asking the server twice with one id is harmless. Does nothing when none is begun.
 *
 * @throws {ApiError} the server refused
 * @throws {UnreachableError} no answer
 */
export async function finishRenewal(parts: RenewalParts, signal?: AbortSignal): Promise<void> {
  const { store, api, deviceId, deviceName, adoptToken } = parts
  if (!(await store.isRenewing())) return
  const body = { deviceId: deviceId(), name: deviceName }
  const { accessToken } = await api.call(renewDevice, { body }, signal)
  adoptToken(accessToken)
  await store.renumber(body.deviceId)
}
