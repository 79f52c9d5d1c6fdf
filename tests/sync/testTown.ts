import { buildOrganisation } from '@/tests/support/buildOrganisation'
import { buildPerson } from '@/tests/support/buildPerson'
import { buildBeat, buildRound, type TestBeat, type TestRound } from '@/tests/support/buildRound'
import type { TestApp } from '@/tests/support/createTestApp'
import { signInAs, type SignedInPerson } from '@/tests/support/signInAs'
import { testPhone, type TestPhone } from './testPhone'

export interface TestTown {
  readonly organisationId: string
  readonly planner: SignedInPerson
  readonly round: TestRound
  readonly beat: TestBeat
  readonly surveyor: SignedInPerson
  readonly phone: TestPhone
  /** A second phone of the same surveyor: two devices on one beat. */
  readonly secondPhone: () => Promise<TestPhone>
}

/** An organisation with a planner, a round of a few buildings, and a surveyor with a beat of all of them. */
export async function testTown(
  testApp: TestApp,
  { outlineCount = 4 }: { outlineCount?: number } = {},
): Promise<TestTown> {
  const { organisationId } = await buildOrganisation(testApp)
  const planner = await signInAs(
    testApp,
    await buildPerson(testApp, { organisationId, roles: ['planner'], name: 'Pia' }),
  )
  const person = await buildPerson(testApp, { organisationId, name: 'Ann' })
  const surveyor = await signInAs(testApp, person)
  const round = await buildRound(testApp, { organisationId, createdBy: planner.personId, outlineCount })
  const beat = await buildBeat(testApp, round, { surveyorId: surveyor.personId, buildingIds: round.buildingIds })
  return {
    organisationId,
    planner,
    round,
    beat,
    surveyor,
    phone: testPhone(testApp, surveyor),
    secondPhone: async () => testPhone(testApp, await signInAs(testApp, person)),
  }
}
