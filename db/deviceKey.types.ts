import type { DevicePublicKey } from '@/shared/schemas/bagFile'
import type { SignText } from '@/shared/sync/sealBag'

/** The key of this device. Its private half cannot be read, not even by this app. */
export interface DeviceKey {
  /** Null where the platform keeps no such keys. */
  readonly publicKey: DevicePublicKey | null
  readonly sign: SignText
}
