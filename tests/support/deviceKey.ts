import { generateKeyPairSync, sign } from 'node:crypto'
import { devicePublicKey, type DevicePublicKey } from '@/shared/schemas/bagFile'
import type { SignText } from '@/shared/sync/sealBag'

/** A key as a device has one. */
export function deviceKey(): { readonly publicKey: DevicePublicKey; readonly sign: SignText } {
  const { publicKey, privateKey } = generateKeyPairSync('ec', { namedCurve: 'P-256' })
  return {
    publicKey: devicePublicKey.parse(publicKey.export({ format: 'jwk' })),
    sign: async (text) =>
      sign('sha256', Buffer.from(text), { key: privateKey, dsaEncoding: 'ieee-p1363' }).toString('base64url'),
  }
}
