import { ComputeError } from '@/shared/compute/errors'

/** Amounts of one cell of a map. */
export interface CellTotal {
  readonly cellId: string
  readonly buildings: number
  readonly amount: number
}

/** What a shared map may show. */
export interface SharedCells {
  readonly shown: readonly CellTotal[]
  /** What lies in cells too thin to be shown, as one total. */
  readonly withheld: { readonly cells: number; readonly buildings: number; readonly amount: number }
}

/** Fewer buildings than this in a cell could give one household away. */
export const FEWEST_BUILDINGS_SHOWN = 3

/**
 * Keeps cells with too few buildings off a shared map; their amounts stay in one total, so nothing gets lost.
 *
 * @param cells cells with at least one building
 * @param fewest smallest number of buildings that may be shown, whole number ≥ 1
 * @returns cells shown, in their order, and the sum of the others
 * @throws {ComputeError} `parameter-out-of-range`
 * @example
 * sharedCells([{ cellId: 'a', buildings: 5, amount: 10 }, { cellId: 'b', buildings: 2, amount: 4 }]).withheld // => { cells: 1, buildings: 2, amount: 4 }
 */
export function sharedCells(cells: readonly CellTotal[], fewest: number = FEWEST_BUILDINGS_SHOWN): SharedCells {
  if (!(Number.isInteger(fewest) && fewest >= 1)) throw new ComputeError('parameter-out-of-range', { fewest })
  const thin = cells.filter(({ buildings }) => buildings < fewest)
  return {
    shown: cells.filter(({ buildings }) => buildings >= fewest),
    withheld: {
      cells: thin.length,
      buildings: thin.reduce((total, { buildings }) => total + buildings, 0),
      amount: thin.reduce((total, { amount }) => total + amount, 0),
    },
  }
}
