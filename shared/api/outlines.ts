import { z } from 'zod'
import {
  attributeMapping,
  blockCollection,
  outlineCollection,
  outlineFault,
  previewFeature,
} from '@/shared/schemas/outline'
import { boundingBox, id, moment, polygonGeometry, typedText } from '@/shared/schemas/primitives'
import { defineEndpoint, nothing } from './defineEndpoint'

export const district = z.object({
  districtId: id,
  name: z.string(),
  outlineCount: z.number().int(),
  blockCount: z.number().int(),
  footprintM2: z.number(),
  boundingBox: boundingBox.nullable(),
})
export type District = z.infer<typeof district>

/** An uploaded file that waits for its mapping; nothing of it is in the district yet. */
export const stagedImport = z.object({
  importId: id,
  fileName: z.string(),
  featureCount: z.number().int(),
  usableCount: z.number().int(),
  boundingBox: boundingBox.nullable(),
  attributes: z.array(
    z.object({ name: z.string(), filledCount: z.number().int(), samples: z.array(z.string()).max(5) }),
  ),
  guess: attributeMapping,
  faults: z.array(outlineFault),
  createdAt: moment,
})
export type StagedImport = z.infer<typeof stagedImport>

/** Body is multipart/form-data with one part `file` (.geojson, .json or .zip of one); limits: 50,000 features, 100 MB unpacked. */
export const uploadOutlines = defineEndpoint({
  method: 'POST',
  path: '/outline-imports',
  audience: ['planner'],
  summary: 'Upload building outlines (GeoJSON, RFC 7946, or zipped) for a look before import.',
  params: nothing,
  query: nothing,
  body: z.unknown(),
  response: stagedImport,
  status: 201,
})

export const previewImport = defineEndpoint({
  method: 'GET',
  path: '/outline-imports/:importId/preview',
  audience: ['planner'],
  summary: 'The usable outlines of a staged file, to draw on the map.',
  params: z.object({ importId: id }),
  query: nothing,
  body: nothing,
  response: z.object({ type: z.literal('FeatureCollection'), features: z.array(previewFeature) }),
})

export const confirmImport = defineEndpoint({
  method: 'POST',
  path: '/outline-imports/:importId/confirm',
  audience: ['planner'],
  summary: 'Import the usable outlines into a new or known district: all of them or, on any failure, none.',
  params: z.object({ importId: id }),
  query: nothing,
  body: z.object({
    mapping: attributeMapping,
    district: z.union([z.object({ districtId: id }), z.object({ name: typedText(120).min(1) })]),
  }),
  response: z.object({
    districtId: id,
    importedCount: z.number().int(),
    leftOutCount: z.number().int(),
    blockCount: z.number().int(),
    /** Register values that were not usable and were left empty, by attribute. */
    unreadableValues: z.record(z.string(), z.number().int()),
  }),
})

export const discardImport = defineEndpoint({
  method: 'DELETE',
  path: '/outline-imports/:importId',
  audience: ['planner'],
  summary: 'Throw a staged file away.',
  params: z.object({ importId: id }),
  query: nothing,
  body: nothing,
  response: nothing,
})

export const listDistricts = defineEndpoint({
  method: 'GET',
  path: '/districts',
  audience: ['planner', 'steward'],
  summary: 'The districts of the organisation.',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.object({ districts: z.array(district) }),
})

export const drawDistrict = defineEndpoint({
  method: 'POST',
  path: '/districts',
  audience: ['planner'],
  summary: 'Make a district from a drawn outline: it takes the outlines whose inner point lies in it.',
  params: nothing,
  query: nothing,
  body: z.object({ name: typedText(120).min(1), geometry: polygonGeometry }),
  response: district,
  status: 201,
})

export const readDistrictOutlines = defineEndpoint({
  method: 'GET',
  path: '/districts/:districtId/outlines',
  audience: ['planner'],
  summary: 'Outlines of a district with what the register says.',
  params: z.object({ districtId: id }),
  query: nothing,
  body: nothing,
  response: outlineCollection,
})

export const readDistrictBlocks = defineEndpoint({
  method: 'GET',
  path: '/districts/:districtId/blocks',
  audience: ['planner'],
  summary: 'Blocks of a district.',
  params: z.object({ districtId: id }),
  query: nothing,
  body: nothing,
  response: blockCollection,
})
