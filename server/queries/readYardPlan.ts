import type { Scope } from '@/server/database'
import { FIRST_YARD_PLAN, yardPlan, type YardPlan } from '@/shared/schemas/yardPlan'

/** The plan of the person who asks; the first one until they keep their own. */
export async function readYardPlan(scope: Scope): Promise<YardPlan> {
  const { organisationId, personId } = scope
  const [row] = await scope.select<{ plan: unknown }>(
    `SELECT plan FROM yard_plan WHERE organisation_id = $organisationId AND person_id = $personId`,
    { organisationId, personId },
  )
  return row ? yardPlan.parse(row.plan) : FIRST_YARD_PLAN
}
