import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { historyOf, playHistory } from './history'
import { BREAKS } from './model.types'

const history = historyOf(100)
const SEED = 20_261_201
/** More by hand: MODEL_RUNS=30000. */
const RUNS = Number(process.env.MODEL_RUNS ?? 1_500)
const MOST_RUNS_TO_FIND = 400

describe('the protocol, played with losses, repeats, restored phones, moved beats and wrong clocks', () => {
  it('P G L loses nothing, does nothing twice, and ends with every phone holding what the server holds', () => {
    fc.assert(
      fc.property(history, (events) => playHistory(events)),
      { numRuns: RUNS, seed: SEED },
    )
  }, 120_000)

  it.each(BREAKS)(
    'is found out when broken on purpose: %s',
    (broken) => {
      const result = fc.check(
        fc.property(history, (events) => playHistory(events, broken)),
        { numRuns: MOST_RUNS_TO_FIND, seed: SEED, endOnFailure: true },
      )

      expect(result.failed).toBe(true)
    },
    60_000,
  )
})
