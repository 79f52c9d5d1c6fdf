import { randomUUID } from 'node:crypto'
import type { z } from 'zod'
import type { Context } from '@/server/context'
import type { Actor, Scope } from '@/server/database'
import { Refusal } from '@/server/errors'
import { makeReferences } from '@/server/outlines/makeReferences'
import type { UsableFeature } from '@/server/outlines/outlines.types'
import { readRegister, type RegisterEntry } from '@/server/outlines/readRegister'
import { readStagedFeatures } from '@/server/queries/readStagedFeatures'
import type { confirmImport as endpoint } from '@/shared/api/outlines'
import { chooseDistrict } from './chooseDistrict'
import { clusterBlocks } from './clusterBlocks'
import { insertOutlines, type NewOutline } from './insertOutlines'
import { recordAudit } from './recordAudit'

type Order = z.output<typeof endpoint.body>
type Report = z.output<typeof endpoint.response>

/**
 * Brings the usable outlines of a waiting file into a district, in one transaction: all of them, or on any failure
 * none. An outline whose reference the district has already is left out, so the same file may come again.
 *
 * @throws {Refusal} `not-found`, `import-settled`, `district-name-taken`, `nothing-to-import`
 */
export async function confirmImport(
  { database }: Pick<Context, 'database'>,
  actor: Actor,
  importId: string,
  order: Order,
): Promise<Report> {
  return database.withScope(actor, async (scope) => {
    const { features, featureCount } = await readStagedFeatures(scope, importId, { lock: true })
    const districtId = await chooseDistrict(scope, order.district)
    const unreadableValues: Record<string, number> = {}
    const outlines = await newOutlines(scope, districtId, features, (feature) =>
      readRegister(feature.attributes, order.mapping, (name) => {
        unreadableValues[name] = (unreadableValues[name] ?? 0) + 1
      }),
    )
    if (outlines.length === 0) throw nothingToImport()
    await insertOutlines(scope, { districtId, importId, outlines })
    const blockCount = await clusterBlocks(scope, { districtId, importId })
    await settle(scope, importId)
    const report = {
      districtId,
      importedCount: outlines.length,
      leftOutCount: featureCount - outlines.length,
      blockCount,
      unreadableValues,
    }
    await recordAudit(scope, {
      action: 'outlines-imported',
      subjectType: 'district',
      subjectId: districtId,
      detail: report,
    })
    return report
  })
}

async function newOutlines(
  scope: Scope,
  districtId: string,
  features: readonly UsableFeature[],
  read: (feature: UsableFeature) => RegisterEntry,
): Promise<NewOutline[]> {
  const taken = await takenReferences(scope, districtId)
  const entries = features
    .map((feature) => ({ feature, register: read(feature) }))
    .filter(({ register }) => register.reference === null || !taken.has(register.reference))
  const references = makeReferences(
    entries.map(({ register }) => register.reference),
    taken,
  )
  return entries.map(({ feature, register }, position) => ({
    ...register,
    outlineId: randomUUID(),
    reference: references[position] ?? '',
    footprintM2: feature.footprintM2,
    geometry: feature.geometry,
    innerPoint: feature.innerPoint,
    attributes: feature.attributes,
  }))
}

async function takenReferences(scope: Scope, districtId: string): Promise<Set<string>> {
  const rows = await scope.select<{ reference: string }>(
    'SELECT reference FROM outline WHERE organisation_id = $organisationId AND district_id = $districtId',
    { organisationId: scope.organisationId, districtId },
  )
  return new Set(rows.map(({ reference }) => reference))
}

/** The file has done its work; its features live on as outlines. */
async function settle(scope: Scope, importId: string): Promise<void> {
  await scope.execute(
    `UPDATE outline_import SET state = 'imported', features = NULL
     WHERE organisation_id = $organisationId AND import_id = $importId`,
    { organisationId: scope.organisationId, importId },
  )
}

const nothingToImport = () =>
  new Refusal(
    422,
    'nothing-to-import',
    'No outline of the file is new to this district. Nothing was changed; look at the faults, or choose another district.',
  )
