import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { QueryTypes, Sequelize } from 'sequelize'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createTestDatabase } from '@/tests/support/testDatabase'
import type { TestDatabase } from '@/tests/support/testDatabaseServer'
import { seedDemo } from './seedDemo'

describe('the demo town', () => {
  let database: TestDatabase
  let owner: Sequelize
  let photoRoot: string

  beforeAll(async () => {
    database = await createTestDatabase()
    owner = new Sequelize(database.ownerUrl, { logging: false })
    photoRoot = await mkdtemp(path.join(tmpdir(), 'tally-photos-'))
    await seedDemo(database.ownerUrl, photoRoot)
  })
  afterAll(async () => {
    await owner.close()
    await database.drop()
    await rm(photoRoot, { recursive: true })
  })

  const one = async (sql: string) => {
    const [row] = await owner.query<Record<string, number>>(sql, { type: QueryTypes.SELECT })
    return row ?? {}
  }

  it('has about 2,400 footprints in three districts, every inner point inside its outline', async () => {
    const { outlines, outside } = await one(
      `SELECT count(*)::int AS outlines, count(*) FILTER (WHERE NOT ST_Contains(geometry, inner_point))::int AS outside FROM outline`,
    )
    expect(outlines).toBeGreaterThan(2_200)
    expect(outlines).toBeLessThan(2_600)
    expect(outside).toBe(0)
  })

  it('has valid outlines whose footprints agree with the ellipsoid of the database', async () => {
    const { invalid, worst } = await one(
      `SELECT count(*) FILTER (WHERE NOT ST_IsValid(geometry))::int AS invalid,
              max(abs(ST_Area(geometry::geography) - footprint_m2) / footprint_m2) AS worst FROM outline`,
    )
    expect(invalid).toBe(0)
    expect(worst).toBeLessThan(0.002)
  })

  it('has two past rounds, a finished one and one under way, with buildings that came down between them', async () => {
    const { rounds, cleared, waiting } = await one(
      `SELECT (SELECT count(*) FROM round)::int AS rounds,
              count(*) FILTER (WHERE finding = 'cleared')::int AS cleared,
              count(*) FILTER (WHERE state = 'handed-in')::int AS waiting FROM sheet`,
    )
    expect(rounds).toBe(4)
    expect(cleared).toBeGreaterThan(10)
    expect(waiting).toBeGreaterThan(20)
  })

  it('has no construction year after the round that recorded it', async () => {
    const { late } = await one(
      `SELECT count(*)::int AS late FROM sheet JOIN round USING (organisation_id, round_id) WHERE year_to > extract(year FROM ends_on)`,
    )
    expect(late).toBe(0)
  })
})
