import { createFieldStore } from '@/db/createFieldStore'
import { createSyncStore } from '@/db/createSyncStore'
import { migrate } from '@/db/migrate'
import type { FieldStore } from '@/db/fieldStore.types'
import type { Driver } from '@/db/driver.types'
import type { DevicePublicKey } from '@/shared/schemas/bagFile'
import type { SyncStore } from '@/db/syncStore.types'
import { deviceKey } from './deviceKey'
import { memoryDriver } from './memoryDriver'
import { memoryTwin, type MemoryTwin } from './memoryTwin'

export interface MemoryPhone {
  readonly driver: Driver
  readonly field: FieldStore
  readonly sync: SyncStore
  readonly twin: MemoryTwin
  /** How much of its space is used. */
  readonly room: { level: 'roomy' | 'tight' | 'full' }
  readonly publicKey: DevicePublicKey
  /** Bytes of photos by their digest. */
  readonly bytes: Map<string, Uint8Array>
  /** Ids it gave out, in their order. */
  readonly nextId: () => string
}

/** A phone whose database lies in memory, with ids and a clock that can be told beforehand. */
export async function memoryPhone(prefix = '1', driver = memoryDriver()): Promise<MemoryPhone> {
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
  const twin = memoryTwin()
  const room: MemoryPhone['room'] = { level: 'roomy' }
  const { publicKey, sign } = deviceKey()
  const owner = {
    organisationId: '01980000-0000-7000-8000-0000000000e1',
    personId: '01980000-0000-7000-8000-0000000000f1',
    deviceId: () => '01980000-0000-7000-8000-0000000000d1',
    sign,
  }
  const parts = { driver, photoFiles, twin, owner, readRoom: async () => room, ...signals }
  return {
    driver,
    twin,
    room,
    publicKey,
    bytes,
    nextId,
    field: createFieldStore({ ...parts, stamp }),
    sync: createSyncStore({ ...parts, now }),
  }
}
