import { z } from 'zod'
import { shareOfOne } from './primitives'

/** What one contractor's yard carries, takes in and recovers; their own figures, seen by nobody else. */
export const yardPlan = z.object({
  /** Volume of one container [m³]. */
  containerM3: z.number().min(0.5).max(120),
  /** What one vehicle may carry [t]. */
  payloadT: z.number().min(0.1).max(60),
  /** What the plant takes in a year [t]; null when it was not said. */
  capacityTPerYear: z.number().min(0).max(10_000_000).nullable(),
  /** Share of the mass of each waste code that the yard recovers as material [–]; codes left out are not known. */
  recoveryShares: z.record(z.string().regex(/^\d{2} \d{2} \d{2}\*?$/), shareOfOne),
})
export type YardPlan = z.infer<typeof yardPlan>

/** Until a contractor says otherwise: a usual roll-off container and lorry (common practice), nothing else. */
export const FIRST_YARD_PLAN: YardPlan = { containerM3: 30, payloadT: 13, capacityTPerYear: null, recoveryShares: {} }
