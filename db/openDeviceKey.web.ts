import { devicePublicKey } from '@/shared/schemas/bagFile'
import type { DeviceKey } from './deviceKey.types'
import { answered, done, openIndexedStore } from './indexedStore'

const STORE = 'key'
const ALGORITHM = { name: 'ECDSA', namedCurve: 'P-256' } as const

/** The key of one person on this browser: made once, kept where scripts can use it and none can take it out. */
export async function openDeviceKey(name: string): Promise<DeviceKey> {
  // without a secure address the browser has no keys; everything else goes on
  if (!globalThis.crypto?.subtle) return { publicKey: null, sign: async () => null }
  const database = await openIndexedStore(`${name}-key`, STORE)
  const found: unknown = await answered(database.transaction(STORE, 'readonly').objectStore(STORE).get('pair'))
  const pair = isPair(found) ? found : await makePair(database)
  database.close()
  return {
    publicKey: devicePublicKey.parse(await crypto.subtle.exportKey('jwk', pair.publicKey)),
    async sign(text) {
      const signing = { name: ALGORITHM.name, hash: 'SHA-256' }
      const bytes = await crypto.subtle.sign(signing, pair.privateKey, new TextEncoder().encode(text))
      return btoa(String.fromCharCode(...new Uint8Array(bytes)))
        .replaceAll('+', '-')
        .replaceAll('/', '_')
        .replace(/=+$/, '')
    },
  }
}

async function makePair(database: IDBDatabase): Promise<CryptoKeyPair> {
  const pair = await crypto.subtle.generateKey(ALGORITHM, false, ['sign', 'verify'])
  const transaction = database.transaction(STORE, 'readwrite', { durability: 'strict' })
  transaction.objectStore(STORE).put(pair, 'pair')
  await done(transaction)
  return pair
}

function isPair(value: unknown): value is CryptoKeyPair {
  return typeof value === 'object' && value !== null && 'privateKey' in value && 'publicKey' in value
}
