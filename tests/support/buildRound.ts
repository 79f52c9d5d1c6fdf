import { randomUUID } from 'node:crypto'
import { buildDistrict, type TestDistrict } from './buildDistrict'
import type { TestApp } from './createTestApp'

export interface TestRound extends TestDistrict {
  readonly roundId: string
  /** One a building of the frame, in the order of `outlineIds`; also the ids of their sheets. */
  readonly buildingIds: readonly string[]
}

export interface TestBeat {
  readonly beatId: string
  readonly buildingIds: readonly string[]
}

/** A round whose frame is a district of its own (or the given one); no beats yet. */
export async function buildRound(
  testApp: Pick<TestApp, 'owner'>,
  arrangement: {
    organisationId: string
    createdBy: string
    outlineCount?: number
    district?: TestDistrict
    name?: string
  },
): Promise<TestRound> {
  const { organisationId, createdBy } = arrangement
  const district = arrangement.district ?? (await buildDistrict(testApp, arrangement))
  const roundId = randomUUID()
  await testApp.owner.run(
    `INSERT INTO round (organisation_id, round_id, district_id, name, starts_on, ends_on, created_by)
     VALUES ($organisationId, $roundId, $districtId, $name, '2026-04-01', '2026-10-31', $createdBy)`,
    { organisationId, roundId, districtId: district.districtId, name: arrangement.name ?? 'Spring round', createdBy },
  )
  const buildings = district.outlineIds.map((outline_id) => ({ outline_id, building_id: randomUUID() }))
  const from = await takeChangeNumbers(testApp, organisationId, buildings.length)
  await testApp.owner.run(
    `INSERT INTO round_building (organisation_id, building_id, round_id, outline_id, change_no)
     SELECT $organisationId, b.building_id, $roundId, b.outline_id, $from::bigint + row_number() OVER () - 1
     FROM json_to_recordset($buildings::json) AS b(outline_id uuid, building_id uuid)`,
    { organisationId, roundId, buildings: JSON.stringify(buildings), from },
  )
  return { ...district, roundId, buildingIds: buildings.map(({ building_id }) => building_id) }
}

/** A beat of some buildings of a round, for one surveyor or nobody yet. */
export async function buildBeat(
  testApp: Pick<TestApp, 'owner'>,
  round: Pick<TestRound, 'organisationId' | 'roundId'>,
  arrangement: { surveyorId: string | null; buildingIds: readonly string[]; name?: string },
): Promise<TestBeat> {
  const beatId = randomUUID()
  const { organisationId, roundId } = round
  const from = await takeChangeNumbers(testApp, organisationId, arrangement.buildingIds.length + 1)
  await testApp.owner.run(
    `INSERT INTO beat (organisation_id, beat_id, round_id, name, surveyor_id, change_no)
     VALUES ($organisationId, $beatId, $roundId, $name, $surveyorId, $from)`,
    { organisationId, beatId, roundId, name: arrangement.name ?? 'Beat 1', surveyorId: arrangement.surveyorId, from },
  )
  await testApp.owner.run(
    `UPDATE round_building b SET beat_id = $beatId, change_no = $from::bigint + i.number
     FROM json_array_elements_text($buildingIds::json) WITH ORDINALITY AS i(building_id, number)
     WHERE b.organisation_id = $organisationId AND b.building_id = i.building_id::uuid`,
    { organisationId, beatId, buildingIds: JSON.stringify(arrangement.buildingIds), from },
  )
  return { beatId, buildingIds: arrangement.buildingIds }
}

/** @returns the first of `count` change numbers of the organisation */
async function takeChangeNumbers(
  { owner }: Pick<TestApp, 'owner'>,
  organisationId: string,
  count: number,
): Promise<number> {
  const [row] = await owner.rows<{ first: string }>(
    `UPDATE organisation SET head = head + $count WHERE organisation_id = $organisationId
     RETURNING head - $count + 1 AS first`,
    { organisationId, count },
  )
  return Number(row?.first)
}
