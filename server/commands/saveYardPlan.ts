import type { Scope } from '@/server/database'
import type { YardPlan } from '@/shared/schemas/yardPlan'

/** Keeps the plan of the person who asks in place of the one before. */
export async function saveYardPlan(scope: Scope, plan: YardPlan): Promise<YardPlan> {
  const { organisationId, personId } = scope
  await scope.execute(
    `INSERT INTO yard_plan (organisation_id, person_id, plan) VALUES ($organisationId, $personId, $plan)
     ON CONFLICT (organisation_id, person_id) DO UPDATE SET plan = EXCLUDED.plan, changed_at = now()`,
    { organisationId, personId, plan: JSON.stringify(plan) },
  )
  return plan
}
