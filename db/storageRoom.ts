/** From here on the person is told, and from here on photos are no longer taken, so that records always fit. */
export const TIGHT_SHARE = 0.8
export const FULL_SHARE = 0.95

export interface StorageRoom {
  readonly usedBytes: number | null
  readonly quotaBytes: number | null
  readonly level: 'roomy' | 'tight' | 'full'
}

/** How much of the space the browser gives is used; `roomy` where it does not say. */
export async function readStorageRoom(): Promise<StorageRoom> {
  const estimate = (await globalThis.navigator?.storage?.estimate?.()) ?? {}
  const usedBytes = estimate.usage ?? null
  const quotaBytes = estimate.quota ?? null
  return { usedBytes, quotaBytes, level: storageLevel(usedBytes, quotaBytes) }
}

/** @param usedBytes, quotaBytes null where they are not known */
export function storageLevel(usedBytes: number | null, quotaBytes: number | null): StorageRoom['level'] {
  if (usedBytes === null || quotaBytes === null || quotaBytes <= 0) return 'roomy'
  const share = usedBytes / quotaBytes
  return share >= FULL_SHARE ? 'full' : share >= TIGHT_SHARE ? 'tight' : 'roomy'
}
