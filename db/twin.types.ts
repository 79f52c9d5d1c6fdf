/** One mutation of the bag as it is kept a second time, outside the database. */
export interface TwinEntry {
  readonly mutationId: string
  /** Its number when it was written; only the order counts. */
  readonly seq: number
  readonly buildingId: string
  readonly putInAt: string
  /** The mutation as JSON, word for word. */
  readonly payload: string
}

/** The second copy of the bag, for when the database is lost or damaged, and the space that is held back for a last save. */
export interface Twin {
  put(entries: readonly TwinEntry[]): Promise<void>
  /** Entries whose check sum is right, in the order of their numbers. */
  all(): Promise<readonly TwinEntry[]>
  /** Forgets every entry that is not named. */
  keepOnly(mutationIds: ReadonlySet<string>): Promise<void>
  /** How many databases were given up before the present one. */
  readGeneration(): Promise<number>
  writeGeneration(generation: number): Promise<void>
  /** Holds some megabytes back, as long as there is room. */
  holdBallast(): Promise<void>
  /** Gives them free. @returns whether there were any */
  dropBallast(): Promise<boolean>
}

export const BALLAST_BYTES = 5 * 1024 * 1024
