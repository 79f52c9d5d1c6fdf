import { shutToOthers, type Migration } from './tenantTable'

/** A contractor's own vehicles, plant and recovery shares. */
export const m0018YardPlan: Migration = {
  name: '20261201-0018-yard-plan',
  up: `
    CREATE TABLE yard_plan (
      organisation_id uuid NOT NULL,
      person_id uuid NOT NULL,
      plan jsonb NOT NULL,
      changed_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (organisation_id, person_id),
      FOREIGN KEY (organisation_id, person_id) REFERENCES person
    );
    ${shutToOthers('yard_plan')}
  `,
  down: `
    DROP TABLE yard_plan;
  `,
}
