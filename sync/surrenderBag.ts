import type { BagFile } from '@/shared/schemas/bagFile'
import type { SyncStore } from '@/db/syncStore.types'
import { ApiError } from './api/ApiError'

export type SendSurrender = (
  file: BagFile,
  signal?: AbortSignal,
) => Promise<{ readonly takenCount: number; readonly knownCount: number; readonly sha256: string }>

/** Whether the server says that this device or its person is shut out. */
export function isShutOut(error: unknown): boolean {
  return error instanceof ApiError && (error.code === 'device-revoked' || error.code === 'account-disabled')
}

/**
 * Hands the bag of a device that is shut out over to the stewards. The bag stays as it is until the receipt for exactly
 * this bag is here; without one everything is kept, to be saved to a file.
 *
 * @returns whether the stewards hold it
 */
export async function surrenderBag(
  { store, sendSurrender }: { readonly store: SyncStore; readonly sendSurrender: SendSurrender },
  signal?: AbortSignal,
): Promise<boolean> {
  const { unanswered, unconfirmed } = await store.countWaiting()
  if (unanswered + unconfirmed === 0 && (await store.readSurrendered()) !== null) return true
  const file = await store.makeBagFile()
  if (file.signature === undefined) return false
  try {
    const receipt = await sendSurrender(file, signal)
    if (receipt.sha256 !== file.sha256) return false
  } catch {
    // whatever stood in the way, the bag is still here; the next try asks again
    return false
  }
  await store.markSurrendered(file.sha256)
  return true
}
