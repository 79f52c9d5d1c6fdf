import type { DeviceKey } from './deviceKey.types'

/** On phones without a web browser there is no key yet: saved copies are unsigned and a steward reads them in. */
export async function openDeviceKey(_name: string): Promise<DeviceKey> {
  return { publicKey: null, sign: async () => null }
}
