/**
 * SQL that shuts a table to other organisations: row-level security enabled and forced,
 * one policy by the organisation of the transaction, and rights for the app's role.
 * With no organisation set, the policy matches nothing. The owner of the tables, who migrates and
 * seeds and never serves a request, has a policy of its own.
 */
export function shutToOthers(table: string, rights = 'SELECT, INSERT, UPDATE, DELETE'): string {
  return `
    ALTER TABLE ${table} ENABLE ROW LEVEL SECURITY;
    ALTER TABLE ${table} FORCE ROW LEVEL SECURITY;
    CREATE POLICY ${table}_owner ON ${table} TO CURRENT_USER USING (true) WITH CHECK (true);
    CREATE POLICY ${table}_own_organisation ON ${table} TO tallystone_app
      USING (organisation_id = (SELECT nullif(current_setting('app.organisation_id', true), '')::uuid))
      WITH CHECK (organisation_id = (SELECT nullif(current_setting('app.organisation_id', true), '')::uuid));
    GRANT ${rights} ON ${table} TO tallystone_app;
  `
}

/** One step of the schema: forward and back. */
export interface Migration {
  readonly name: string
  readonly up: string
  readonly down: string
}
