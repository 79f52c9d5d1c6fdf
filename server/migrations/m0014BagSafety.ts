import { shutToOthers, type Migration } from './tenantTable'

/**
 * What keeps a bag safe when a device is shut out or lost: the public key of a device, where an entry of the quarantine
 * came from and who settled it; room for photos of an organisation, and when an upload last got bytes.
 */
export const m0014BagSafety: Migration = {
  name: '20261201-0014-bag-safety',
  up: `
    CREATE TABLE device_key (
      organisation_id uuid NOT NULL,
      device_id uuid NOT NULL,
      public_key jsonb NOT NULL,
      enrolled_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (organisation_id, device_id),
      FOREIGN KEY (organisation_id, device_id) REFERENCES device ON DELETE CASCADE
    );
    ${shutToOthers('device_key', 'SELECT, INSERT')}
    ALTER TABLE quarantine
      ADD COLUMN source text NOT NULL DEFAULT 'refused' CHECK (source IN ('refused', 'surrendered', 'imported')),
      ADD COLUMN settled_by uuid, ADD COLUMN settled_at timestamptz, ADD COLUMN settled_note text,
      ADD FOREIGN KEY (organisation_id, settled_by) REFERENCES person;
    CREATE INDEX quarantine_waiting ON quarantine (organisation_id, received_at) WHERE state = 'waiting';
    ALTER TABLE organisation ADD COLUMN photo_quota_bytes bigint NOT NULL DEFAULT 53687091200 CHECK (photo_quota_bytes >= 0);
    ALTER TABLE photo ADD COLUMN upload_at timestamptz;
    CREATE INDEX photo_unfinished ON photo (organisation_id, upload_at) WHERE upload_at IS NOT NULL;

    CREATE FUNCTION organisations_to_tidy() RETURNS TABLE (organisation_id uuid)
      LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp
      AS $$ SELECT organisation_id FROM organisation $$;
    REVOKE ALL ON FUNCTION organisations_to_tidy() FROM PUBLIC;
    GRANT EXECUTE ON FUNCTION organisations_to_tidy() TO tallystone_app;
  `,
  down: `
    DROP FUNCTION organisations_to_tidy();
    DROP INDEX photo_unfinished;
    ALTER TABLE photo DROP COLUMN upload_at;
    ALTER TABLE organisation DROP COLUMN photo_quota_bytes;
    DROP INDEX quarantine_waiting;
    ALTER TABLE quarantine DROP COLUMN source, DROP COLUMN settled_by, DROP COLUMN settled_at, DROP COLUMN settled_note;
    DROP TABLE device_key;
  `,
}
