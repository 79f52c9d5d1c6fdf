import type { z } from 'zod'
import type { Context } from '@/server/context'
import type { Scope } from '@/server/database'
import { conflictWith, Refusal } from '@/server/errors'
import type { BagFile } from '@/shared/schemas/bagFile'
import type { bagReceipt } from '@/shared/api/quarantine'
import { isSignedByDevice, requireWholeFile, takeBagFile } from './takeBagFile'

/**
 * Takes the bag of a device or person that is shut out, which has no session any more: the key of the device is its only
 * proof. Everything waits in quarantine; the answer is a receipt and shows nothing else.
 *
 * @throws {Refusal} `surrender-refused` in the same words for whatever does not fit, `device-not-shut`, `input-not-usable`
 */
export async function surrenderBag(
  { database, now, log }: Pick<Context, 'database' | 'now' | 'log'>,
  file: BagFile,
): Promise<z.input<typeof bagReceipt>> {
  requireWholeFile(file)
  const { organisationId, personId, deviceId } = file.bag
  return database.withScope({ organisationId, personId }, async (scope) => {
    if (!(await isSignedByDevice(scope, file))) throw refused()
    await requireShutOut(scope, deviceId)
    const receipt = await takeBagFile(scope, file, { source: 'surrendered', now: now() })
    log.warn({ deviceId, takenCount: receipt.takenCount }, 'bag surrendered')
    return receipt
  })
}

async function requireShutOut(scope: Scope, deviceId: string): Promise<void> {
  const [device] = await scope.select<{ is_shut: boolean }>(
    `SELECT d.revoked_at IS NOT NULL OR p.status <> 'active' AS is_shut
     FROM device d JOIN person p USING (organisation_id, person_id)
     WHERE d.organisation_id = $organisationId AND d.device_id = $deviceId AND d.person_id = $personId`,
    { organisationId: scope.organisationId, personId: scope.personId, deviceId },
  )
  if (!device) throw refused()
  if (!device.is_shut) throw notShut()
}

const refused = () =>
  new Refusal(
    403,
    'surrender-refused',
    'This bag cannot be taken from this device. Nothing was changed; save a copy to a file and give it to your steward.',
  )
const notShut = () =>
  conflictWith('device-not-shut', 'This device may hand in as usual. Nothing was changed; sign in and hand in.')
