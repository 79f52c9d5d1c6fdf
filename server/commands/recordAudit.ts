import type { Scope } from '@/server/database'

/** What is kept for the steward: who did what to which thing. Never a password, a token or an answer of a sheet. */
export interface AuditEntry {
  readonly action: string
  readonly subjectType?: string
  readonly subjectId?: string
  readonly detail?: Readonly<Record<string, unknown>>
}

/** Writes one line of the audit trail in the transaction of the act itself, so neither is there without the other. */
export async function recordAudit(scope: Scope, entry: AuditEntry): Promise<void> {
  await scope.execute(
    `INSERT INTO audit_entry (organisation_id, person_id, action, subject_type, subject_id, detail)
     VALUES ($organisationId, $personId, $action, $subjectType, $subjectId, $detail::jsonb)`,
    {
      organisationId: scope.organisationId,
      personId: scope.personId,
      action: entry.action,
      subjectType: entry.subjectType ?? null,
      subjectId: entry.subjectId ?? null,
      detail: JSON.stringify(entry.detail ?? {}),
    },
  )
}
