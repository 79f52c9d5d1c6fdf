import { shutToOthers, type Migration } from './tenantTable'

/** Factor book, runs and publications. */
export const m0003Planning: Migration = {
  name: '20261201-0003-planning',
  up: `
    CREATE TABLE edition (
      organisation_id uuid NOT NULL REFERENCES organisation,
      edition_id uuid NOT NULL,
      number integer NOT NULL,
      name text NOT NULL,
      state text NOT NULL CHECK (state IN ('draft', 'issued')),
      issued_at timestamptz,
      issued_by uuid,
      PRIMARY KEY (organisation_id, edition_id),
      UNIQUE (organisation_id, number)
    );
    ${shutToOthers('edition')}

    CREATE TABLE factor_row (
      organisation_id uuid NOT NULL,
      edition_id uuid NOT NULL,
      row_id uuid NOT NULL,
      kind text NOT NULL CHECK (kind IN ('intensity', 'lifetime', 'density', 'waste-code', 'suspicion')),
      position integer NOT NULL,
      /* the row as its schema in the contract says */
      content jsonb NOT NULL,
      PRIMARY KEY (organisation_id, edition_id, row_id),
      FOREIGN KEY (organisation_id, edition_id) REFERENCES edition
    );
    ${shutToOthers('factor_row')}

    CREATE FUNCTION refuse_change_of_issued_edition() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      IF EXISTS (
        SELECT 1 FROM edition e
        WHERE e.organisation_id = coalesce(NEW.organisation_id, OLD.organisation_id)
          AND e.edition_id = coalesce(NEW.edition_id, OLD.edition_id) AND e.state = 'issued'
      ) THEN
        RAISE EXCEPTION 'an issued edition does not change' USING ERRCODE = 'check_violation';
      END IF;
      RETURN coalesce(NEW, OLD);
    END $$;
    CREATE TRIGGER factor_row_of_issued_edition BEFORE INSERT OR UPDATE OR DELETE ON factor_row
      FOR EACH ROW EXECUTE FUNCTION refuse_change_of_issued_edition();

    CREATE TABLE run (
      organisation_id uuid NOT NULL,
      run_id uuid NOT NULL,
      number integer NOT NULL,
      round_id uuid NOT NULL,
      edition_id uuid NOT NULL,
      scenario jsonb NOT NULL,
      survey_year integer NOT NULL,
      engine_version text NOT NULL,
      seed bigint NOT NULL,
      state text NOT NULL CHECK (state IN ('queued', 'running', 'done', 'failed', 'cancelled')),
      progress_share double precision NOT NULL DEFAULT 0,
      failure text,
      inputs jsonb,
      inputs_sha256 text,
      result jsonb,
      result_sha256 text,
      created_by uuid NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      finished_at timestamptz,
      PRIMARY KEY (organisation_id, run_id),
      UNIQUE (organisation_id, number),
      FOREIGN KEY (organisation_id, round_id) REFERENCES round,
      FOREIGN KEY (organisation_id, edition_id) REFERENCES edition
    );
    ${shutToOthers('run')}

    CREATE TABLE run_building (
      organisation_id uuid NOT NULL,
      run_id uuid NOT NULL,
      building_id uuid NOT NULL,
      content jsonb NOT NULL,
      PRIMARY KEY (organisation_id, run_id, building_id),
      FOREIGN KEY (organisation_id, run_id) REFERENCES run
    );
    ${shutToOthers('run_building')}

    CREATE FUNCTION refuse_change_of_finished_run() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      IF OLD.state = 'done' THEN
        RAISE EXCEPTION 'a finished run does not change' USING ERRCODE = 'check_violation';
      END IF;
      RETURN coalesce(NEW, OLD);
    END $$;
    CREATE TRIGGER finished_run BEFORE UPDATE OR DELETE ON run
      FOR EACH ROW EXECUTE FUNCTION refuse_change_of_finished_run();

    CREATE TABLE publication (
      organisation_id uuid NOT NULL,
      publication_id uuid NOT NULL,
      run_id uuid NOT NULL,
      title text NOT NULL,
      published_by uuid NOT NULL,
      published_at timestamptz NOT NULL DEFAULT now(),
      withdrawn_at timestamptz,
      withdrawn_by uuid,
      withdrawal_reason text,
      PRIMARY KEY (organisation_id, publication_id),
      FOREIGN KEY (organisation_id, run_id) REFERENCES run
    );
    ${shutToOthers('publication', 'SELECT, INSERT, UPDATE')}

    CREATE TABLE publication_recipient (
      organisation_id uuid NOT NULL,
      publication_id uuid NOT NULL,
      person_id uuid NOT NULL,
      PRIMARY KEY (organisation_id, publication_id, person_id),
      FOREIGN KEY (organisation_id, publication_id) REFERENCES publication,
      FOREIGN KEY (organisation_id, person_id) REFERENCES person
    );
    ${shutToOthers('publication_recipient', 'SELECT, INSERT')}
  `,
  down: `
    DROP TABLE publication_recipient, publication, run_building, run, factor_row, edition;
    DROP FUNCTION refuse_change_of_issued_edition(), refuse_change_of_finished_run();
  `,
}
