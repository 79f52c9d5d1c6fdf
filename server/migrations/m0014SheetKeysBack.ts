import type { Migration } from './tenantTable'

/**
 * The foreign keys of a sheet that steps 7 and 8 dropped are back: measured over the whole way of handing in they cost
 * about a tenth, and a row that refers to nothing must be impossible, not only unlikely.
 */
export const m0014SheetKeysBack: Migration = {
  name: '20261201-0014-sheet-keys-back',
  up: `
    ALTER TABLE sheet ADD FOREIGN KEY (organisation_id, round_id) REFERENCES round,
      ADD FOREIGN KEY (organisation_id, outline_id) REFERENCES outline,
      ADD FOREIGN KEY (organisation_id, recorded_by) REFERENCES person;
  `,
  down: `
    ALTER TABLE sheet DROP CONSTRAINT sheet_organisation_id_round_id_fkey,
      DROP CONSTRAINT sheet_organisation_id_outline_id_fkey, DROP CONSTRAINT sheet_organisation_id_recorded_by_fkey;
  `,
}
