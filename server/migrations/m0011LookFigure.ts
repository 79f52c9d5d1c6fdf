import { shutToOthers, type Migration } from './tenantTable'

/** The figure that looks of a round are to make surer. */
export const m0011LookFigure: Migration = {
  name: '20261201-0011-look-figure',
  up: `
    CREATE TABLE look_figure (
      organisation_id uuid NOT NULL,
      round_id uuid NOT NULL,
      figure jsonb NOT NULL,
      chosen_by uuid NOT NULL,
      chosen_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (organisation_id, round_id),
      FOREIGN KEY (organisation_id, round_id) REFERENCES round ON DELETE CASCADE,
      FOREIGN KEY (organisation_id, chosen_by) REFERENCES person
    );
    ${shutToOthers('look_figure')}
  `,
  down: `
    DROP TABLE look_figure;
  `,
}
