import { BAG_FILE_FORMAT, BAG_FILE_VERSION, bagFileMessage, type BagFile } from '@/shared/schemas/bagFile'
import { canonicalJson } from './canonicalJson'

/** Signs a text with the key of the device: 64 bytes of ECDSA P-256 as base64url; null where there is no key. */
export type SignText = (text: string) => Promise<string | null>

/** Makes the file of a bag: its digest, so that a cut copy is seen, and its signature, so that it is known whose it is. */
export async function sealBag(bag: BagFile['bag'], now: Date, sign: SignText): Promise<BagFile> {
  const digest = await crypto.subtle.digest('SHA-256', new TextEncoder().encode(canonicalJson(bag)))
  const sha256 = Array.from(new Uint8Array(digest), (byte) => byte.toString(16).padStart(2, '0')).join('')
  const signature = await sign(bagFileMessage(bag.deviceId, sha256))
  return {
    format: BAG_FILE_FORMAT,
    version: BAG_FILE_VERSION,
    savedAt: now.toISOString(),
    sha256,
    ...(signature === null ? {} : { signature }),
    bag,
  }
}
