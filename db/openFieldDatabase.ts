import type { Account } from '@/shared/schemas/person'
import { createFieldStore } from './createFieldStore'
import { createSyncStore } from './createSyncStore'
import { sha256Hex } from './exportBag'
import type { FieldStore } from './fieldStore.types'
import { newId } from './newId'
import { openDatabase } from './openDatabase'
import { openDeviceKey } from './openDeviceKey'
import { openPhotoFiles } from './openPhotoFiles'
import { openTwin } from './openTwin'
import { openWithTwin } from './openWithTwin'
import type { OpenOptions } from './openDatabase.types'
import { readStorageRoom } from './storageRoom'
import type { DevicePublicKey } from '@/shared/schemas/bagFile'
import type { SyncStore } from './syncStore.types'
import type { Twin } from './twin.types'

export interface FieldDatabase {
  readonly field: FieldStore
  readonly sync: SyncStore
  /** Of this device; null where the platform keeps no keys. */
  readonly publicKey: DevicePublicKey | null
  /** Mutations that came back from the second copy, because the database was lost or damaged. */
  readonly recoveredCount: number
  close(): Promise<void>
}

/**
 * Opens the database of one person of one organisation on this device. Another person gets another one, so that no work
 * can be handed in under a foreign name.
 *
 * @throws {OpenElsewhereError} another tab has it
 */
export async function openFieldDatabase(
  { organisationId, personId }: Pick<Account, 'organisationId' | 'personId'>,
  options: OpenOptions & { readonly deviceId: () => string },
): Promise<FieldDatabase> {
  const digest = await sha256Hex(new TextEncoder().encode(`${organisationId}:${personId}`))
  const name = `tallystone-${digest.slice(0, 24)}`
  const twin = await openTwin(name)
  const open = (generation: number) =>
    openDatabase(generation === 0 ? `${name}.db` : `${name}-${generation}.db`, options)
  const { driver, recoveredCount } = await openWithTwin(open, twin)
  try {
    const photoFiles = await openPhotoFiles(name)
    const { publicKey, sign } = await openDeviceKey(name)
    const owner = { organisationId, personId, deviceId: options.deviceId, sign }
    const listeners = new Set<() => void>()
    const signals = {
      changed: () => listeners.forEach((listener) => listener()),
      subscribe: (listener: () => void) => {
        listeners.add(listener)
        return () => listeners.delete(listener)
      },
    }
    const stamp = { newId: () => newId(), now: () => new Date(), elapsedMs: () => performance.now() }
    const parts = { driver, photoFiles, twin, owner, readRoom: readStorageRoom, ...signals }
    await holdBallast(twin)
    return {
      field: createFieldStore({ ...parts, stamp }),
      sync: createSyncStore({ ...parts, now: stamp.now }),
      publicKey,
      recoveredCount,
      close: () => driver.close(),
    }
  } catch (error) {
    await driver.close()
    throw error
  }
}

/** Only where there is room: what is held back must not be what is missing. */
async function holdBallast(twin: Twin): Promise<void> {
  if ((await readStorageRoom()).level !== 'roomy') return
  await twin.holdBallast().catch(() => undefined)
}
