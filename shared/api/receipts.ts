import { z } from 'zod'
import { id, calendarYear } from '@/shared/schemas/primitives'
import { provenance } from '@/shared/schemas/factorBook'
import { receipt, receiptFigure } from '@/shared/schemas/receipt'
import { material } from '@/shared/schemas/run'
import { defineEndpoint, nothing } from './defineEndpoint'
import { fleet, publication, wasteLine } from './publications'

const year = z.coerce.number().pipe(calendarYear)

export const readReceipt = defineEndpoint({
  method: 'GET',
  path: '/runs/:runId/receipt',
  audience: ['planner'],
  summary: 'A figure of a run down to its groups, buildings, factor rows and sources; the parts add up to it.',
  params: z.object({ runId: id }),
  query: z.object({
    kind: receiptFigure.shape.kind.default('stock'),
    material: receiptFigure.shape.material.default('all'),
    fromYear: year.optional(),
    toYear: year.optional(),
    use: receiptFigure.shape.use.unwrap().optional(),
    structure: receiptFigure.shape.structure.unwrap().optional(),
    period: receiptFigure.shape.period.unwrap().optional(),
    buildingId: id.optional(),
  }),
  body: nothing,
  response: receipt,
})

const lowLikelyHigh = z.object({ low: z.number(), likely: z.number(), high: z.number() })

/** One line of a publication down to what was published with it: materials and flows, and no building. */
export const loadReceipt = z.object({
  publication,
  fleet,
  line: wasteLine,
  parts: z.array(
    z.object({
      material,
      flow: z.enum(['demolition', 'refurbishment']),
      massKg: lowLikelyHigh,
      /** Loose bulk densities: the low one makes the high volume. */
      densityKgPerM3: lowLikelyHigh,
      looseVolumeM3: lowLikelyHigh,
    }),
  ),
  densities: z.array(z.object({ material, source: z.string(), provenance })),
  /** Where the contents come from, one entry a source. */
  sources: z.array(z.object({ source: z.string(), provenance, materials: z.array(material) })),
})
export type LoadReceipt = z.infer<typeof loadReceipt>

export const readLoadReceipt = defineEndpoint({
  method: 'GET',
  path: '/yard/publications/:publicationId/receipt',
  audience: ['contractor'],
  summary: 'How a line of the loads ahead comes about, at the grain at which it was published.',
  params: z.object({ publicationId: id }),
  query: fleet.extend({ code: z.string().max(20), year }),
  body: nothing,
  response: loadReceipt,
})
