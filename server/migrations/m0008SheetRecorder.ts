import type { Migration } from './tenantTable'

/**
 * Who recorded a sheet is the person of the request, read from the database when it began, and people are never removed
 * while their devices are there; looking the person up again for each sheet of a batch took a quarter of writing it.
 */
export const m0008SheetRecorder: Migration = {
  name: '20261201-0008-sheet-recorder',
  up: `ALTER TABLE sheet DROP CONSTRAINT sheet_organisation_id_recorded_by_fkey;`,
  down: `ALTER TABLE sheet ADD FOREIGN KEY (organisation_id, recorded_by) REFERENCES person;`,
}
