import { randomUUID } from 'node:crypto'
import type { Context } from '@/server/context'
import type { Actor, Scope } from '@/server/database'
import { Refusal } from '@/server/errors'
import { guessMapping } from '@/server/outlines/guessMapping'
import { judgeFeatures } from '@/server/outlines/judgeFeatures'
import type { JudgedFeatures, RawFeature } from '@/server/outlines/outlines.types'
import { readAttributes } from '@/server/outlines/readAttributes'
import { readFeatures } from '@/server/outlines/readFeatures'
import { summariseAttributes } from '@/server/outlines/summariseAttributes'
import { unpackFile } from '@/server/outlines/unpackFile'
import { knownPosition } from '@/server/queries/knownPosition'
import type { StagedImport } from '@/shared/api/outlines'
import type { BoundingBox } from '@/shared/schemas/primitives'

/** Files that wait at once for their mapping; the oldest makes room. */
const WAITING_FILES = 5
const FILE_NAME = /\.(geojson|json|zip)$/i

/**
 * Reads, judges and keeps an uploaded file for a look. Nothing of it is in any district yet.
 *
 * @throws {Refusal} `file-kind-not-known` and the refusals of reading a file
 */
export async function stageOutlines(
  { database, now }: Pick<Context, 'database' | 'now'>,
  actor: Actor,
  file: { name: string; bytes: Uint8Array },
): Promise<StagedImport> {
  const fileName = plainName(file.name)
  if (!FILE_NAME.test(fileName)) {
    throw new Refusal(
      415,
      'file-kind-not-known',
      'Only .geojson, .json and .zip files hold outlines. Nothing was imported; export the outlines as GeoJSON.',
    )
  }
  const features = readFeatures(unpackFile(file.bytes))
  const known = await database.withScope(actor, knownPosition, { readOnly: true })
  const judged = await judgeFeatures(features, known)
  const staged: StagedImport = {
    importId: randomUUID(),
    fileName,
    ...summarise(features, judged),
    createdAt: now().toISOString(),
  }
  await database.withScope(actor, async (scope) => {
    await keep(scope, staged, judged)
    await makeRoom(scope)
  })
  return staged
}

function summarise(features: readonly RawFeature[], { usable, faults }: JudgedFeatures) {
  const rows = usable.map(({ attributes }) => attributes)
  const guess = guessMapping(rows)
  const referenceOf = (index: number) => {
    const value =
      guess.reference === null ? undefined : readAttributes(features[index]?.properties ?? {})[guess.reference]
    return value === undefined ? null : String(value).slice(0, 80)
  }
  return {
    featureCount: features.length,
    usableCount: usable.length,
    boundingBox: boundingBoxOf(usable.map(({ innerPoint }) => innerPoint)),
    attributes: summariseAttributes(rows),
    guess,
    faults: faults.map((fault) => ({ ...fault, reference: referenceOf(fault.index) })),
  }
}

function boundingBoxOf(points: readonly (readonly [number, number])[]): BoundingBox | null {
  if (points.length === 0) return null
  const box: BoundingBox = [180, 90, -180, -90]
  for (const [longitude, latitude] of points) {
    box[0] = Math.min(box[0], longitude)
    box[1] = Math.min(box[1], latitude)
    box[2] = Math.max(box[2], longitude)
    box[3] = Math.max(box[3], latitude)
  }
  return box
}

async function keep(scope: Scope, staged: StagedImport, { usable }: JudgedFeatures): Promise<void> {
  await scope.execute(
    `INSERT INTO outline_import (organisation_id, import_id, file_name, staged, features, created_by, created_at)
     VALUES ($organisationId, $importId, $fileName, $staged::jsonb, $features::jsonb, $personId, $createdAt)`,
    {
      organisationId: scope.organisationId,
      importId: staged.importId,
      fileName: staged.fileName,
      staged: JSON.stringify(staged),
      features: JSON.stringify(usable),
      personId: scope.personId,
      createdAt: staged.createdAt,
    },
  )
}

async function makeRoom(scope: Scope): Promise<void> {
  await scope.execute(
    `DELETE FROM outline_import WHERE organisation_id = $organisationId AND import_id IN (
       SELECT import_id FROM outline_import WHERE organisation_id = $organisationId AND state = 'staged'
       ORDER BY created_at DESC, import_id OFFSET $most)`,
    { organisationId: scope.organisationId, most: WAITING_FILES },
  )
}

/** The last part of what the browser called the file, without control characters. */
function plainName(name: string): string {
  const last = name.split(/[\\/]/).at(-1) ?? ''
  return last.replace(/\p{C}/gu, '').slice(-200)
}
