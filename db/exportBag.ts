import type { Statements } from './driver.types'
import { makeBagFile, type BagOwner } from './makeBagFile'

/** All work that only this phone holds as the text of a file, and a name for it. */
export async function exportBag(
  inside: Statements,
  owner: BagOwner,
  now: Date,
): Promise<{ fileName: string; json: string }> {
  const file = await makeBagFile(inside, owner, now)
  return {
    fileName: `bag-${now.toISOString().slice(0, 16).replaceAll(':', '')}.json`,
    json: JSON.stringify(file, null, 1),
  }
}

/** SHA-256 of bytes as 64 hexadecimal digits. */
export async function sha256Hex(bytes: Uint8Array<ArrayBuffer>): Promise<string> {
  const digest = await crypto.subtle.digest('SHA-256', bytes)
  return Array.from(new Uint8Array(digest), (byte) => byte.toString(16).padStart(2, '0')).join('')
}
