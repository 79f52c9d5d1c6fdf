import type { Account } from '@/shared/schemas/person'
import { createFieldStore } from './createFieldStore'
import { createSyncStore } from './createSyncStore'
import { sha256Hex } from './exportBag'
import type { FieldStore } from './fieldStore.types'
import { migrate } from './migrate'
import { newId } from './newId'
import { openDatabase } from './openDatabase'
import { openPhotoFiles } from './openPhotoFiles'
import type { OpenOptions } from './openDatabase.types'
import type { SyncStore } from './syncStore.types'

export interface FieldDatabase {
  readonly field: FieldStore
  readonly sync: SyncStore
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
  options: OpenOptions,
): Promise<FieldDatabase> {
  const digest = await sha256Hex(new TextEncoder().encode(`${organisationId}:${personId}`))
  const name = `tallystone-${digest.slice(0, 24)}`
  const driver = await openDatabase(`${name}.db`, options)
  try {
    await migrate(driver)
    const photoFiles = await openPhotoFiles(name)
    const listeners = new Set<() => void>()
    const signals = {
      changed: () => listeners.forEach((listener) => listener()),
      subscribe: (listener: () => void) => {
        listeners.add(listener)
        return () => listeners.delete(listener)
      },
    }
    const stamp = { newId: () => newId(), now: () => new Date(), elapsedMs: () => performance.now() }
    return {
      field: createFieldStore({ driver, photoFiles, stamp, ...signals }),
      sync: createSyncStore({ driver, photoFiles, now: stamp.now, ...signals }),
      close: () => driver.close(),
    }
  } catch (error) {
    await driver.close()
    throw error
  }
}
