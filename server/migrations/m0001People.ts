import { shutToOthers, type Migration } from './tenantTable'

/**
 * Organisations, people, sessions and devices.
 *
 * Sign-in happens before an organisation is known, so four functions of the owner look up exactly
 * what sign-in needs (by address or by token digest); the app's role may call them and nothing more.
 */
export const m0001People: Migration = {
  name: '20261201-0001-people',
  up: `
    CREATE TABLE organisation (
      organisation_id uuid PRIMARY KEY,
      name text NOT NULL,
      is_demo boolean NOT NULL DEFAULT false,
      head bigint NOT NULL DEFAULT 0,
      floor bigint NOT NULL DEFAULT 0,
      created_at timestamptz NOT NULL DEFAULT now()
    );
    ${shutToOthers('organisation', 'SELECT, UPDATE')}

    CREATE TABLE person (
      organisation_id uuid NOT NULL REFERENCES organisation,
      person_id uuid NOT NULL,
      email text NOT NULL,
      name text NOT NULL,
      firm text,
      password_hash text,
      roles text[] NOT NULL,
      language text NOT NULL DEFAULT 'en',
      status text NOT NULL CHECK (status IN ('invited', 'active', 'disabled')),
      scope_epoch bigint NOT NULL DEFAULT 1,
      created_at timestamptz NOT NULL DEFAULT now(),
      last_seen_at timestamptz,
      PRIMARY KEY (organisation_id, person_id)
    );
    CREATE UNIQUE INDEX person_email ON person (lower(email));
    ${shutToOthers('person')}

    CREATE TABLE device (
      organisation_id uuid NOT NULL,
      device_id uuid NOT NULL,
      person_id uuid NOT NULL,
      name text NOT NULL,
      last_seq bigint NOT NULL DEFAULT 0,
      app_version text,
      enrolled_at timestamptz NOT NULL DEFAULT now(),
      last_seen_at timestamptz,
      revoked_at timestamptz,
      PRIMARY KEY (organisation_id, device_id),
      FOREIGN KEY (organisation_id, person_id) REFERENCES person
    );
    ${shutToOthers('device')}

    CREATE TABLE session (
      organisation_id uuid NOT NULL,
      session_id uuid NOT NULL,
      person_id uuid NOT NULL,
      device_id uuid NOT NULL,
      generation integer NOT NULL DEFAULT 0,
      token_sha256 text NOT NULL,
      parent_sha256 text,
      rotation_sha256 text,
      child_used boolean NOT NULL DEFAULT true,
      created_at timestamptz NOT NULL DEFAULT now(),
      last_used_at timestamptz NOT NULL DEFAULT now(),
      revoked_at timestamptz,
      revoked_because text,
      PRIMARY KEY (organisation_id, session_id),
      FOREIGN KEY (organisation_id, person_id) REFERENCES person,
      FOREIGN KEY (organisation_id, device_id) REFERENCES device
    );
    CREATE INDEX session_token ON session (token_sha256);
    CREATE INDEX session_parent ON session (parent_sha256);
    CREATE INDEX session_person ON session (organisation_id, person_id);
    ${shutToOthers('session')}

    CREATE TABLE one_time_token (
      organisation_id uuid NOT NULL,
      token_sha256 text NOT NULL,
      person_id uuid NOT NULL,
      purpose text NOT NULL CHECK (purpose IN ('invitation', 'password-reset')),
      expires_at timestamptz NOT NULL,
      used_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (organisation_id, token_sha256),
      FOREIGN KEY (organisation_id, person_id) REFERENCES person
    );
    CREATE UNIQUE INDEX one_time_token_digest ON one_time_token (token_sha256);
    ${shutToOthers('one_time_token')}

    CREATE TABLE audit_entry (
      organisation_id uuid NOT NULL REFERENCES organisation,
      audit_id bigint GENERATED ALWAYS AS IDENTITY,
      person_id uuid,
      action text NOT NULL,
      subject_type text,
      subject_id text,
      detail jsonb NOT NULL DEFAULT '{}',
      at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (organisation_id, audit_id)
    );
    CREATE INDEX audit_entry_at ON audit_entry (organisation_id, at DESC);
    ${shutToOthers('audit_entry', 'SELECT, INSERT')}

    CREATE FUNCTION sign_in_lookup(address text)
      RETURNS TABLE (organisation_id uuid, person_id uuid, password_hash text, status text)
      LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public
      AS $$ SELECT p.organisation_id, p.person_id, p.password_hash, p.status FROM person p WHERE lower(p.email) = lower(address) $$;
    CREATE FUNCTION session_lookup(digest text)
      RETURNS TABLE (organisation_id uuid, session_id uuid, person_id uuid)
      LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public
      AS $$ SELECT s.organisation_id, s.session_id, s.person_id FROM session s WHERE s.token_sha256 = digest OR s.parent_sha256 = digest $$;
    CREATE FUNCTION one_time_token_lookup(digest text)
      RETURNS TABLE (organisation_id uuid, person_id uuid, purpose text)
      LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public
      AS $$ SELECT t.organisation_id, t.person_id, t.purpose FROM one_time_token t
            WHERE t.token_sha256 = digest AND t.used_at IS NULL AND t.expires_at > now() $$;
    REVOKE ALL ON FUNCTION sign_in_lookup(text), session_lookup(text), one_time_token_lookup(text) FROM PUBLIC;
    GRANT EXECUTE ON FUNCTION sign_in_lookup(text), session_lookup(text), one_time_token_lookup(text) TO tallystone_app;
  `,
  down: `
    DROP FUNCTION sign_in_lookup(text), session_lookup(text), one_time_token_lookup(text);
    DROP TABLE audit_entry, one_time_token, session, device, person, organisation;
  `,
}
