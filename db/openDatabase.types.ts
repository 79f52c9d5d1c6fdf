import type { Driver } from './driver.types'

export interface OpenOptions {
  /** Asks the tab that owns the database to let go of it. */
  readonly takeOver?: boolean
  /** Called when another tab took the database over; the driver is closed then. */
  readonly onTaken: () => void
}

export type OpenDatabase = (name: string, options: OpenOptions) => Promise<Driver>
