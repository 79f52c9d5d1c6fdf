import type { Role } from '@/shared/schemas/person'

const HOMES: readonly (readonly [Role, string])[] = [
  ['surveyor', '/today'],
  ['planner', '/district'],
  ['contractor', '/loads-ahead'],
  ['steward', '/people'],
]

/** Where a person's side begins; of several roles the one that is out in the street first. */
export function homeOf(roles: readonly Role[]): string {
  return HOMES.find(([role]) => roles.includes(role))?.[1] ?? '/sign-in'
}
