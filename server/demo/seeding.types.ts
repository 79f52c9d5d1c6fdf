import type { Sequelize, Transaction } from 'sequelize'
import { stableId } from '@/server/stableId'
import type { TownBuilding } from './town.types'

/** Where the seeding of one organisation stands. */
export interface Seeding {
  readonly sequelize: Sequelize
  readonly transaction: Transaction
  readonly organisationId: string
  readonly photoRoot: string
  /** Next change number of the organisation. */
  nextChange(): number
}

export interface SeededBuilding extends TownBuilding {
  readonly outlineId: string
  readonly blockId: string
  readonly footprintM2: number
}

export const demoId = (...parts: readonly (string | number)[]) => stableId('demo', ...parts)
