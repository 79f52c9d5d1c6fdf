import type { Structure, Use } from '@/shared/compute/factors/vocabulary'
import type { DistrictName } from './townNames'

export type Corner = readonly [eastM: number, northM: number]

/** Numbers in [0, 1), the same for the same seed. */
export interface Random {
  next(): number
}

/** An invented building as it really is; surveys of it err, registers leave things out. */
export interface TownBuilding {
  readonly district: DistrictName
  readonly blockNumber: number
  readonly street: string
  readonly houseNumber: string
  readonly corners: readonly Corner[]
  readonly use: Use
  readonly structure: Structure
  readonly storeys: number
  readonly atticShare: number
  readonly basementShare: number
  readonly year: number
  readonly condition: 'good' | 'fair' | 'poor' | 'ruinous'
  readonly vacancy: 'occupied' | 'partly-vacant' | 'vacant'
  readonly isProtected: boolean
  /** Year in which it came down, if it did before the present. */
  readonly clearedYear: number | null
}

export interface TownBlock {
  readonly district: DistrictName
  readonly number: number
  readonly name: string
  readonly corners: readonly Corner[]
}

export interface Town {
  readonly buildings: readonly TownBuilding[]
  readonly blocks: readonly TownBlock[]
}
