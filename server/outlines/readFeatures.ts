import { z } from 'zod'
import { Refusal } from '@/server/errors'
import type { RawFeature } from './outlines.types'

export const FEATURE_LIMIT = 50_000

const feature = z.object({
  type: z.literal('Feature'),
  geometry: z.unknown(),
  properties: z.record(z.string(), z.unknown()).nullish(),
})
const collection = z.object({ type: z.literal('FeatureCollection'), features: z.array(z.unknown()) })

/**
 * The features of a GeoJSON text, in their order. One that is no feature at all counts as one without geometry, so
 * that positions in the file stay true.
 *
 * @throws {Refusal} `file-not-geojson`, `file-empty`, `too-many-features`
 */
export function readFeatures(text: string): RawFeature[] {
  const content = parse(text)
  const asCollection = collection.safeParse(content)
  const members = asCollection.success ? asCollection.data.features : [content]
  if (!asCollection.success && !feature.safeParse(content).success) throw notGeoJson()
  if (members.length === 0) {
    throw new Refusal(422, 'file-empty', 'The file holds no features. Nothing was imported.')
  }
  if (members.length > FEATURE_LIMIT) {
    throw new Refusal(
      413,
      'too-many-features',
      `The file holds ${members.length} features; at most ${FEATURE_LIMIT} go in at once. Nothing was imported; cut it by district.`,
    )
  }
  return members.map((member) => {
    const parsed = feature.safeParse(member)
    return parsed.success
      ? { geometry: parsed.data.geometry, properties: parsed.data.properties ?? {} }
      : { geometry: null, properties: {} }
  })
}

function parse(text: string): unknown {
  try {
    return JSON.parse(text)
  } catch {
    throw notGeoJson()
  }
}

const notGeoJson = () =>
  new Refusal(
    422,
    'file-not-geojson',
    'The file is not a GeoJSON feature collection (RFC 7946). Nothing was imported; export it again as GeoJSON in WGS 84.',
  )
