import { createFieldStore } from '@/db/createFieldStore'
import { createSyncStore } from '@/db/createSyncStore'
import { migrate } from '@/db/migrate'
import type { FieldStore } from '@/db/fieldStore.types'
import type { Driver } from '@/db/driver.types'
import type { SyncStore } from '@/db/syncStore.types'
import { memoryDriver } from './memoryDriver'

export interface MemoryPhone {
  readonly driver: Driver
  readonly field: FieldStore
  readonly sync: SyncStore
  /** Ids it gave out, in their order. */
  readonly nextId: () => string
}

/** A phone whose database lies in memory, with ids and a clock that can be told beforehand. */
export async function memoryPhone(prefix = '1'): Promise<MemoryPhone> {
  const driver = memoryDriver()
  await migrate(driver)
  let given = 0
  const nextId = () => `0198${prefix.padStart(4, '0')}-0000-7000-8000-${String((given += 1)).padStart(12, '0')}`
  const now = () => new Date('2026-10-13T14:08:00Z')
  const listeners = new Set<() => void>()
  const bytes = new Map<string, Uint8Array>()
  const photoFiles = {
    write: async (sha256: string, content: Uint8Array) => void bytes.set(sha256, content),
    read: async (sha256: string) => bytes.get(sha256) ?? null,
    remove: async (sha256: string) => void bytes.delete(sha256),
  }
  const signals = {
    changed: () => listeners.forEach((listener) => listener()),
    subscribe: (listener: () => void) => {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
  }
  const stamp = { newId: nextId, now, elapsedMs: () => 5 }
  return {
    driver,
    nextId,
    field: createFieldStore({ driver, photoFiles, stamp, ...signals }),
    sync: createSyncStore({ driver, photoFiles, now, ...signals }),
  }
}
