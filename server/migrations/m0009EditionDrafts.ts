import type { Migration } from './tenantTable'

/** Drafts of editions: a note, and an issued edition that nobody changes, deletes or takes rows from. */
export const m0009EditionDrafts: Migration = {
  name: '20261201-0009-edition-drafts',
  up: `
    ALTER TABLE edition ADD COLUMN note text;
    CREATE FUNCTION refuse_change_of_issued_edition_itself() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      IF OLD.state = 'issued' THEN
        RAISE EXCEPTION 'an issued edition does not change' USING ERRCODE = 'check_violation';
      END IF;
      RETURN coalesce(NEW, OLD);
    END $$;
    CREATE TRIGGER issued_edition BEFORE UPDATE OR DELETE ON edition
      FOR EACH ROW EXECUTE FUNCTION refuse_change_of_issued_edition_itself();

    /* a row moved between editions touches both */
    CREATE OR REPLACE FUNCTION refuse_change_of_issued_edition() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      IF EXISTS (
        SELECT 1 FROM edition e
        WHERE e.state = 'issued' AND (
          (e.organisation_id = NEW.organisation_id AND e.edition_id = NEW.edition_id)
          OR (e.organisation_id = OLD.organisation_id AND e.edition_id = OLD.edition_id))
      ) THEN
        RAISE EXCEPTION 'an issued edition does not change' USING ERRCODE = 'check_violation';
      END IF;
      RETURN coalesce(NEW, OLD);
    END $$;
  `,
  down: `
    DROP TRIGGER issued_edition ON edition;
    DROP FUNCTION refuse_change_of_issued_edition_itself();
    ALTER TABLE edition DROP COLUMN note;
  `,
}
