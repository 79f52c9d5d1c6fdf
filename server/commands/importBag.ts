import type { z } from 'zod'
import type { Context } from '@/server/context'
import type { Actor, Scope } from '@/server/database'
import { unusable } from '@/server/errors'
import type { importBag as endpoint } from '@/shared/api/quarantine'
import type { BagFile } from '@/shared/schemas/bagFile'
import { recordAudit } from './recordAudit'
import { isSignedByDevice, requireWholeFile, takeBagFile } from './takeBagFile'

/**
 * Reads in a copy that a phone saved to a file. Every entry waits in quarantine under the name of the phone's person;
 * whether the file is signed by the phone is said, because a file can be written by anybody.
 *
 * @throws {Refusal} `input-not-usable` for a file that was changed, or is of a device that is not of this organisation
 */
export async function importBag(
  { database, now }: Pick<Context, 'database' | 'now'>,
  actor: Actor,
  file: BagFile,
): Promise<z.input<typeof endpoint.response>> {
  requireWholeFile(file)
  return database.withScope(actor, async (scope) => {
    const personName = await personOfDevice(scope, file)
    const isSigned = await isSignedByDevice(scope, file)
    const receipt = await takeBagFile(scope, file, { source: 'imported', now: now() })
    await recordAudit(scope, {
      action: 'bag-imported',
      subjectType: 'device',
      subjectId: file.bag.deviceId,
      detail: { ...receipt, isSigned },
    })
    return { ...receipt, isSigned, personName }
  })
}

async function personOfDevice(scope: Scope, { bag }: BagFile): Promise<string> {
  const [row] = await scope.select<{ name: string }>(
    `SELECT p.name FROM device d JOIN person p USING (organisation_id, person_id)
     WHERE d.organisation_id = $organisationId AND d.device_id = $deviceId AND d.person_id = $personId`,
    { organisationId: scope.organisationId, deviceId: bag.deviceId, personId: bag.personId },
  )
  if (row && bag.organisationId === scope.organisationId) return row.name
  throw unusable('This file comes from a device that your organisation does not know. Nothing was read in.', [
    { pointer: '/body/bag/deviceId', code: 'device-unknown', detail: 'no device of the organisation has this id' },
  ])
}
