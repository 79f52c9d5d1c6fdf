import type { Migration } from './tenantTable'

/**
 * What signing in needs before the organisation of a request is known. Each function answers only to somebody who
 * already holds the ids of a signed token, or the address that was typed.
 */
export const m0004Sessions: Migration = {
  name: '20261201-0004-sessions',
  up: `
    CREATE FUNCTION signed_in_lookup(organisation uuid, person uuid, session uuid, device uuid)
      RETURNS TABLE (organisation_name text, is_demo boolean, name text, email text, roles text[], language text,
        status text, is_session_open boolean, is_device_revoked boolean)
      LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp
      AS $$
        SELECT o.name, o.is_demo, p.name, p.email, p.roles, p.language, p.status,
          s.revoked_at IS NULL, d.revoked_at IS NOT NULL
        FROM session s
        JOIN person p ON p.organisation_id = s.organisation_id AND p.person_id = s.person_id
        JOIN device d ON d.organisation_id = s.organisation_id AND d.device_id = s.device_id
        JOIN organisation o ON o.organisation_id = s.organisation_id
        WHERE s.organisation_id = organisation AND s.session_id = session
          AND s.person_id = person AND s.device_id = device AND d.person_id = person
      $$;
    CREATE FUNCTION is_device_of(address text, device uuid) RETURNS boolean
      LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp
      AS $$
        SELECT EXISTS (
          SELECT FROM device d JOIN person p ON p.organisation_id = d.organisation_id AND p.person_id = d.person_id
          WHERE lower(p.email) = lower(address) AND d.device_id = device AND d.revoked_at IS NULL
        )
      $$;
    REVOKE ALL ON FUNCTION signed_in_lookup(uuid, uuid, uuid, uuid), is_device_of(text, uuid) FROM PUBLIC;
    GRANT EXECUTE ON FUNCTION signed_in_lookup(uuid, uuid, uuid, uuid), is_device_of(text, uuid) TO tallystone_app;
    DROP FUNCTION session_lookup(text);
  `,
  down: `
    DROP FUNCTION signed_in_lookup(uuid, uuid, uuid, uuid), is_device_of(text, uuid);
    CREATE FUNCTION session_lookup(digest text)
      RETURNS TABLE (organisation_id uuid, session_id uuid, person_id uuid)
      LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp
      AS $$ SELECT s.organisation_id, s.session_id, s.person_id FROM session s WHERE s.token_sha256 = digest OR s.parent_sha256 = digest $$;
    REVOKE ALL ON FUNCTION session_lookup(text) FROM PUBLIC;
    GRANT EXECUTE ON FUNCTION session_lookup(text) TO tallystone_app;
  `,
}
