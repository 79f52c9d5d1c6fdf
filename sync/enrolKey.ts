import { enrolDeviceKey } from '@/shared/api/sync'
import type { DevicePublicKey } from '@/shared/schemas/bagFile'
import type { SyncStore } from '@/db/syncStore.types'
import { ApiError } from './api/ApiError'
import type { ApiClient } from './api/createApiClient'

export interface KeyParts {
  readonly store: SyncStore
  readonly api: ApiClient
  readonly deviceId: () => string
  readonly publicKey: DevicePublicKey | null
}

/** Tells the server the public key of this device, once for each device id. Does nothing where there is no key. */
export async function enrolKey({ store, api, deviceId, publicKey }: KeyParts, signal?: AbortSignal): Promise<void> {
  const id = deviceId()
  if (publicKey === null || (await store.isKeyEnrolled(id))) return
  try {
    await api.call(enrolDeviceKey, { body: { deviceId: id, publicKey } }, signal)
  } catch (error) {
    // another key is known for this id: saved copies count as unsigned, and asking again changes nothing
    if (!(error instanceof ApiError) || error.code !== 'key-differs') throw error
  }
  await store.noteKeyEnrolled(id)
}
