import type { Context } from '@/server/context'
import { conflictWith } from '@/server/errors'
import type { SignedIn } from '@/server/middleware/signedIn'
import { requireOwnDevice } from '@/server/policies/requireOwnDevice'
import type { DevicePublicKey } from '@/shared/schemas/bagFile'
import { canonicalJson } from '@/shared/sync/canonicalJson'

/**
 * Remembers the public key of a device, once; its private half never leaves the device. With it the device can hand its
 * bag over when it has no session any more. The same key again is harmless, another one is refused.
 *
 * @throws {Refusal} `other-device`, `key-differs`
 */
export async function enrolDeviceKey(
  { database, now }: Pick<Context, 'database' | 'now'>,
  signedIn: SignedIn,
  { deviceId, publicKey }: { deviceId: string; publicKey: DevicePublicKey },
): Promise<{ isEnrolled: true }> {
  requireOwnDevice(signedIn, deviceId)
  const { organisationId } = signedIn
  await database.withScope(signedIn, async (scope) => {
    await scope.execute(
      `INSERT INTO device_key (organisation_id, device_id, public_key, enrolled_at)
       VALUES ($organisationId, $deviceId, $publicKey::jsonb, $now) ON CONFLICT DO NOTHING`,
      { organisationId, deviceId, publicKey: JSON.stringify(publicKey), now: now() },
    )
    const [kept] = await scope.select<{ public_key: unknown }>(
      'SELECT public_key FROM device_key WHERE organisation_id = $organisationId AND device_id = $deviceId',
      { organisationId, deviceId },
    )
    if (canonicalJson(kept?.public_key) !== canonicalJson(publicKey)) throw keyDiffers()
  })
  return { isEnrolled: true }
}

const keyDiffers = () =>
  conflictWith(
    'key-differs',
    'This device has another key here. Nothing was changed; handing in works, only signed copies need a new device id.',
  )
