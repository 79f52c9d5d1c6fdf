import { z } from 'zod'

/** Calendar year of the trade: old cathedrals to far plans. */
export const calendarYear = z.number().int().min(1000).max(2300)

/** A day without a time, ISO 8601. */
export const calendarDay = z.iso.date()

/** A moment, ISO 8601 with offset. */
export const moment = z.iso.datetime({ offset: true })

export const id = z.uuid()

/** Text a person typed: trimmed, no control characters but line breaks and tabs. */
export function typedText(maxLength: number) {
  return z
    .string()
    .trim()
    .max(maxLength)
    .refine((text) => !hasControlCharacter(text), { error: 'contains a control character' })
}

function hasControlCharacter(text: string): boolean {
  for (const character of text) {
    const code = character.codePointAt(0) ?? 0
    if (code === 0x7f || (code < 0x20 && code !== 0x09 && code !== 0x0a && code !== 0x0d)) return true
  }
  return false
}

export const email = z
  .email()
  .max(254)
  .transform((address) => address.trim().toLowerCase())

/** Fifteen characters advised, eight the least, nothing cut off. */
export const password = z.string().min(8).max(200)

export const shareOfOne = z.number().min(0).max(1)

/** [longitude, latitude] in degrees, WGS 84. */
export const position2d = z.tuple([z.number().min(-180).max(180), z.number().min(-90).max(90)])

export const polygonGeometry = z.object({
  type: z.literal('Polygon'),
  coordinates: z.array(z.array(position2d).min(4)).min(1),
})
export type PolygonGeometry = z.infer<typeof polygonGeometry>

export const multiPolygonGeometry = z.object({
  type: z.literal('MultiPolygon'),
  coordinates: z.array(z.array(z.array(position2d).min(4)).min(1)).min(1),
})

export const areaGeometry = z.discriminatedUnion('type', [polygonGeometry, multiPolygonGeometry])
export type AreaGeometry = z.infer<typeof areaGeometry>

/** west, south, east, north in degrees. */
export const boundingBox = z.tuple([z.number(), z.number(), z.number(), z.number()])
export type BoundingBox = z.infer<typeof boundingBox>
