import { Refusal } from '@/server/errors'
import type { SignedIn } from '@/server/middleware/signedIn'

/** A token speaks for one device only. @throws {Refusal} `other-device` */
export function requireOwnDevice({ deviceId }: SignedIn, named: string): void {
  if (deviceId === named) return
  throw new Refusal(
    403,
    'other-device',
    'This session belongs to another device. Nothing was changed and nothing is lost; sign in on this device.',
  )
}
