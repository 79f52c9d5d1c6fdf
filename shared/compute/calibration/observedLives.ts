import { ComputeError } from '@/shared/compute/errors'

/** A building as a register saw it: from an age, to an age, and whether it came down then. */
export interface ObservedLife {
  /** Age when the register began to watch it [yr], 0 when it saw it built. */
  readonly entryAgeYears: number
  readonly exitAgeYears: number
  readonly isDemolished: boolean
}

/**
 * Refuses lives that cannot have been observed.
 *
 * @throws {ComputeError} `empty-input`, `interval-reversed`
 * @example
 * requireLives([{ entryAgeYears: 0, exitAgeYears: 9, isDemolished: true }]) // => undefined
 */
export function requireLives(lives: readonly ObservedLife[]): void {
  if (lives.length === 0) throw new ComputeError('empty-input', { what: 'observed lives' })
  for (const { entryAgeYears, exitAgeYears } of lives) {
    if (!(entryAgeYears >= 0 && exitAgeYears > entryAgeYears))
      throw new ComputeError('interval-reversed', { entryAgeYears, exitAgeYears })
  }
}
