import { z } from 'zod'
import { USES } from '@/shared/compute/factors/vocabulary'
import { areaGeometry, calendarYear, id, typedText } from './primitives'

/** What a register said of an outline before anybody looked. Null is "the register does not say". */
export const registerAttributes = z.object({
  year: calendarYear.nullable(),
  storeys: z.number().min(0.5).max(150).nullable(),
  heightM: z.number().min(0).max(900).nullable(),
  use: z.enum(USES).nullable(),
})
export type RegisterAttributes = z.infer<typeof registerAttributes>

export const outline = z.object({
  outlineId: id,
  reference: typedText(80),
  street: typedText(120).nullable(),
  houseNumber: typedText(20).nullable(),
  footprintM2: z.number().positive(),
  blockId: id.nullable(),
  register: registerAttributes,
})
export type Outline = z.infer<typeof outline>

export const outlineFeature = z.object({
  type: z.literal('Feature'),
  id,
  geometry: areaGeometry,
  properties: outline,
})
export const outlineCollection = z.object({ type: z.literal('FeatureCollection'), features: z.array(outlineFeature) })
export type OutlineCollection = z.infer<typeof outlineCollection>

export const blockFeature = z.object({
  type: z.literal('Feature'),
  id,
  geometry: areaGeometry,
  properties: z.object({ blockId: id, name: z.string(), outlineCount: z.number().int() }),
})
export const blockCollection = z.object({ type: z.literal('FeatureCollection'), features: z.array(blockFeature) })

/** Why a feature of an uploaded file cannot be taken, one code a kind. */
export const OUTLINE_FAULTS = [
  'no-geometry',
  'not-a-polygon',
  'too-few-positions',
  'not-closed',
  'self-crossing',
  'duplicate',
  'coordinates-swapped',
  'coordinates-projected',
  'coordinates-out-of-range',
  'no-area',
] as const
export const outlineFault = z.object({
  /** Position in the file, from 0. */
  index: z.number().int(),
  reference: z.string().nullable(),
  code: z.enum(OUTLINE_FAULTS),
  /** True when the fault was mended on the way in (a ring closed); the outline is taken. */
  isMended: z.boolean(),
})
export type OutlineFault = z.infer<typeof outlineFault>

/** Our attribute ← the name it has in the uploaded file; null leaves it empty. */
export const attributeMapping = z.object({
  reference: z.string().max(200).nullable(),
  street: z.string().max(200).nullable(),
  houseNumber: z.string().max(200).nullable(),
  year: z.string().max(200).nullable(),
  storeys: z.string().max(200).nullable(),
  heightM: z.string().max(200).nullable(),
  use: z.string().max(200).nullable(),
})
export type AttributeMapping = z.infer<typeof attributeMapping>

export const previewFeature = z.object({
  type: z.literal('Feature'),
  id: z.number().int(),
  geometry: areaGeometry,
  properties: z.object({ index: z.number().int() }),
})
