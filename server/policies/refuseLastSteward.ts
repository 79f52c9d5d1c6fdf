import { conflictWith } from '@/server/errors'
import type { Role } from '@/shared/schemas/person'

/** What a steward wants of a person. */
export interface PersonChange {
  readonly roles?: readonly Role[] | undefined
  readonly status?: 'active' | 'disabled' | undefined
}

/**
 * An organisation never loses its last steward: nobody could let anybody in again.
 *
 * @param otherStewards active stewards besides the person
 * @throws {Refusal} `last-steward`
 */
export function refuseLastSteward(
  person: { roles: readonly Role[]; status: string },
  change: PersonChange,
  otherStewards: number,
): void {
  const isSteward = person.status === 'active' && person.roles.includes('steward')
  const stays = (change.status ?? person.status) === 'active' && (change.roles ?? person.roles).includes('steward')
  if (!isSteward || stays || otherStewards > 0) return
  throw conflictWith(
    'last-steward',
    'This is the last steward of the organisation. Nothing was changed; make somebody else a steward first.',
  )
}
