import { mkdir } from 'node:fs/promises'
import { hash } from '@node-rs/argon2'
import { Sequelize, type Transaction } from 'sequelize'
import { publishedEdition } from '@/server/factorBook/publishedEdition'
import { editionToRows } from '@/server/factorBook/editionToRows'
import { demoRandom } from './demoRandom'
import { insertRows } from './insertRows'
import { layOutTown } from './layOutTown'
import { demoId, type SeededBuilding, type Seeding } from './seeding.types'
import { seedRounds } from './seedRounds'
import { seedRuns } from './seedRuns'
import { footprintM2, innerPointText, toMultiPolygonText } from './townGeometry'
import { DEMO_ORGANISATION, DEMO_PASSWORD, DEMO_PEOPLE, DISTRICTS } from './townNames'

/**
 * Loads the invented town Saltmarsh Hythe, whole or not at all, as the owner of the tables.
 *
 * @returns the demo accounts, one a role
 */
export async function seedDemo(
  ownerUrl: string,
  photoRoot: string,
): Promise<{ role: string; name: string; email: string; password: string }[]> {
  const sequelize = new Sequelize(ownerUrl, { dialect: 'postgres', logging: false, pool: { max: 2 } })
  try {
    await mkdir(photoRoot, { recursive: true })
    await sequelize.transaction((transaction) => seedTown(sequelize, transaction, photoRoot))
  } finally {
    await sequelize.close()
  }
  await seedRuns(ownerUrl)
  return demoAccounts()
}

export function demoAccounts() {
  return DEMO_PEOPLE.slice(0, 4).map(({ name, email, roles }) => ({
    role: roles[0],
    name,
    email,
    password: DEMO_PASSWORD,
  }))
}

async function seedTown(sequelize: Sequelize, transaction: Transaction, photoRoot: string): Promise<void> {
  const organisationId = demoId('organisation')
  let change = 0
  const seeding: Seeding = { sequelize, transaction, organisationId, photoRoot, nextChange: () => ++change }
  const insert = (table: string, rows: readonly Readonly<Record<string, unknown>>[]) =>
    insertRows(sequelize, transaction, table, rows)

  await insert('organisation', [
    {
      organisation_id: organisationId,
      name: DEMO_ORGANISATION,
      is_demo: true,
      head: 0,
      floor: 0,
      created_at: '2016-03-01T08:00:00Z',
    },
  ])
  const passwordHash = await hash(DEMO_PASSWORD)
  await insert(
    'person',
    DEMO_PEOPLE.map(({ key, name, email, roles, firm }) => ({
      organisation_id: organisationId,
      person_id: demoId('person', key),
      email,
      name,
      firm,
      password_hash: passwordHash,
      roles,
      language: 'en',
      status: 'active',
      scope_epoch: 1,
      created_at: '2016-03-01T08:00:00Z',
    })),
  )
  await seedEdition(seeding, insert)
  const buildings = await seedOutlines(insert, organisationId)
  await seedRounds(seeding, buildings)
  await sequelize.query('UPDATE organisation SET head = $head WHERE organisation_id = $organisationId', {
    bind: { head: change, organisationId },
    transaction,
  })
}

type Insert = (table: string, rows: readonly Readonly<Record<string, unknown>>[]) => Promise<void>

async function seedEdition({ sequelize, transaction, organisationId }: Seeding, insert: Insert): Promise<void> {
  const editionId = demoId('edition', 1)
  await insert('edition', [
    { organisation_id: organisationId, edition_id: editionId, number: 1, name: 'Published figures', state: 'draft' },
  ])
  await insert(
    'factor_row',
    editionToRows(publishedEdition()).map((row) => ({
      organisation_id: organisationId,
      edition_id: editionId,
      ...row,
    })),
  )
  await sequelize.query(
    `UPDATE edition SET state = 'issued', issued_at = '2026-01-12T09:00:00Z', issued_by = $by WHERE organisation_id = $organisationId`,
    {
      bind: { organisationId, by: demoId('person', 'planner') },
      transaction,
    },
  )
}

async function seedOutlines(insert: Insert, organisationId: string): Promise<SeededBuilding[]> {
  const random = demoRandom('town')
  const town = layOutTown(random)
  await insert(
    'district',
    DISTRICTS.map(({ name }) => ({
      organisation_id: organisationId,
      district_id: demoId('district', name),
      name,
      created_at: '2016-03-01T08:00:00Z',
    })),
  )
  await insert(
    'block',
    town.blocks.map(({ district, number, name, corners }) => ({
      organisation_id: organisationId,
      block_id: demoId('block', district, number),
      district_id: demoId('district', district),
      name,
      geometry: toMultiPolygonText(corners),
    })),
  )
  const buildings = town.buildings.map((building, index) => ({
    ...building,
    outlineId: demoId('outline', index),
    blockId: demoId('block', building.district, building.blockNumber),
    footprintM2: footprintM2(building.corners),
  }))
  const knows = (share: number) => random.next() < share
  await insert(
    'outline',
    buildings.map((building, index) => ({
      organisation_id: organisationId,
      outline_id: building.outlineId,
      district_id: demoId('district', building.district),
      block_id: building.blockId,
      reference: `${building.district[0]}-${String(index + 1).padStart(4, '0')}`,
      street: building.street,
      house_number: building.houseNumber,
      footprint_m2: building.footprintM2,
      register_year: knows(0.55) ? building.year : null,
      register_storeys: knows(0.6) ? building.storeys : null,
      register_height_m: knows(0.85) ? Math.round((building.storeys * 3 + building.atticShare * 2.4) * 10) / 10 : null,
      register_use: knows(0.8) ? building.use : null,
      attributes: {},
      geometry: toMultiPolygonText(building.corners),
      inner_point: innerPointText(building.corners),
    })),
  )
  return buildings
}
