import { shutToOthers, type Migration } from './tenantTable'

/**
 * What handing in needs beside the rows themselves: the change number of the planner's last word, who deleted, who once
 * walked a beat, and finding a mutation by the number its device gave it.
 */
export const m0006Sync: Migration = {
  name: '20261201-0006-sync',
  up: `
    ALTER TABLE sheet ADD COLUMN review_change bigint, ADD COLUMN delete_change bigint, ADD COLUMN delete_device uuid;
    ALTER TABLE photo ADD COLUMN thumbnail_sha256 text;
    ALTER TABLE scope_exit ADD COLUMN at timestamptz NOT NULL DEFAULT now();
    CREATE INDEX scope_exit_change ON scope_exit (organisation_id, beat_id, change_no);
    CREATE UNIQUE INDEX applied_mutation_sequence ON applied_mutation (organisation_id, device_id, seq);
    ALTER TABLE quarantine ADD COLUMN entity_type text, ADD COLUMN entity_id uuid;
    CREATE INDEX quarantine_entity ON quarantine (organisation_id, entity_id) WHERE state = 'waiting';

    CREATE TABLE beat_assignment (
      organisation_id uuid NOT NULL,
      beat_id uuid NOT NULL,
      person_id uuid NOT NULL,
      /* null while the person walks the beat */
      until_at timestamptz,
      PRIMARY KEY (organisation_id, beat_id, person_id),
      FOREIGN KEY (organisation_id, beat_id) REFERENCES beat ON DELETE CASCADE,
      FOREIGN KEY (organisation_id, person_id) REFERENCES person
    );
    CREATE INDEX beat_assignment_person ON beat_assignment (organisation_id, person_id);
    ${shutToOthers('beat_assignment')}
    INSERT INTO beat_assignment (organisation_id, beat_id, person_id, until_at)
      SELECT organisation_id, beat_id, surveyor_id, deleted_at FROM beat WHERE surveyor_id IS NOT NULL;

    CREATE FUNCTION note_beat_assignment() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      IF TG_OP = 'UPDATE' AND OLD.surveyor_id IS NOT NULL
        AND (NEW.surveyor_id IS DISTINCT FROM OLD.surveyor_id OR NEW.deleted_at IS NOT NULL) THEN
        UPDATE beat_assignment SET until_at = now()
        WHERE organisation_id = OLD.organisation_id AND beat_id = OLD.beat_id AND person_id = OLD.surveyor_id
          AND until_at IS NULL;
      END IF;
      IF NEW.surveyor_id IS NOT NULL AND NEW.deleted_at IS NULL THEN
        INSERT INTO beat_assignment (organisation_id, beat_id, person_id)
        VALUES (NEW.organisation_id, NEW.beat_id, NEW.surveyor_id)
        ON CONFLICT (organisation_id, beat_id, person_id) DO UPDATE SET until_at = NULL;
      END IF;
      RETURN NULL;
    END $$;
    CREATE TRIGGER beat_assignment AFTER INSERT OR UPDATE OF surveyor_id, deleted_at ON beat
      FOR EACH ROW EXECUTE FUNCTION note_beat_assignment();
  `,
  down: `
    DROP TRIGGER beat_assignment ON beat;
    DROP FUNCTION note_beat_assignment();
    DROP TABLE beat_assignment;
    DROP INDEX quarantine_entity, applied_mutation_sequence, scope_exit_change;
    ALTER TABLE quarantine DROP COLUMN entity_type, DROP COLUMN entity_id;
    ALTER TABLE scope_exit DROP COLUMN at;
    ALTER TABLE photo DROP COLUMN thumbnail_sha256;
    ALTER TABLE sheet DROP COLUMN review_change, DROP COLUMN delete_change, DROP COLUMN delete_device;
  `,
}
