import type { Migration } from './tenantTable'

/**
 * Round and outline of a sheet are copied from its building in the frame, which refers to both and is never removed
 * while the round is there; checking them again at each write took a third of the time of handing in.
 */
export const m0007SheetKeys: Migration = {
  name: '20261201-0007-sheet-keys',
  up: `
    ALTER TABLE sheet DROP CONSTRAINT sheet_organisation_id_round_id_fkey,
      DROP CONSTRAINT sheet_organisation_id_outline_id_fkey;
  `,
  down: `
    ALTER TABLE sheet ADD FOREIGN KEY (organisation_id, round_id) REFERENCES round,
      ADD FOREIGN KEY (organisation_id, outline_id) REFERENCES outline;
  `,
}
