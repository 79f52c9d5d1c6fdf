import type { Person, Role } from '@/shared/schemas/person'

/** Columns of {@link PersonRow}, for a SELECT or RETURNING of `person`. */
export const PERSON_COLUMNS = 'person_id, name, email, roles, status, firm, last_seen_at'

export interface PersonRow {
  person_id: string
  name: string
  email: string
  roles: Role[]
  status: Person['status']
  firm: string | null
  last_seen_at: Date | null
}

export function presentPerson(row: PersonRow): Person {
  return {
    personId: row.person_id,
    name: row.name,
    email: row.email,
    roles: row.roles,
    status: row.status,
    firm: row.firm,
    lastSeenAt: row.last_seen_at?.toISOString() ?? null,
  } satisfies Person
}
