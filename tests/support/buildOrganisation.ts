import { randomUUID } from 'node:crypto'
import type { TestApp } from './createTestApp'

export interface TestOrganisation {
  readonly organisationId: string
  readonly name: string
}

/** An organisation of its own, so that tests of one file never meet. */
export async function buildOrganisation(
  { owner }: Pick<TestApp, 'owner'>,
  overrides: { name?: string; isDemo?: boolean } = {},
): Promise<TestOrganisation> {
  const organisation = { organisationId: randomUUID(), name: overrides.name ?? 'Ferrow Survey' }
  await owner.run(
    'INSERT INTO organisation (organisation_id, name, is_demo) VALUES ($organisationId, $name, $isDemo)',
    {
      ...organisation,
      isDemo: overrides.isDemo ?? false,
    },
  )
  return organisation
}
