import type { DistrictName } from './townNames'

export type SheetState = 'handed-in' | 'checked' | 'sent-back'

export interface RoundPlan {
  readonly key: string
  readonly name: string
  readonly district: DistrictName
  readonly startsOn: string
  readonly endsOn: string
  readonly year: number
  readonly beatCount: number
  /** State of the n-th of `count` buildings of a beat; null is to do. */
  readonly stateOf: (beat: number, place: number, count: number, draw: number) => SheetState | null
}

const allChecked = () => 'checked' as const

/** Two past rounds to learn from, one finished this year, and one under way. */
export const ROUNDS: readonly RoundPlan[] = [
  {
    key: 'ropewalk-2016',
    name: 'Ropewalk, first round',
    district: 'Ropewalk',
    startsOn: '2016-04-04',
    endsOn: '2016-09-30',
    year: 2016,
    beatCount: 6,
    stateOf: allChecked,
  },
  {
    key: 'ropewalk-2021',
    name: 'Ropewalk, second round',
    district: 'Ropewalk',
    startsOn: '2021-04-06',
    endsOn: '2021-09-24',
    year: 2021,
    beatCount: 6,
    stateOf: allChecked,
  },
  {
    key: 'kiln-2026',
    name: 'Kiln Quarter, summer round',
    district: 'Kiln Quarter',
    startsOn: '2026-05-04',
    endsOn: '2026-08-28',
    year: 2026,
    beatCount: 5,
    stateOf: allChecked,
  },
  {
    key: 'ropewalk-2026',
    name: 'Ropewalk, autumn round',
    district: 'Ropewalk',
    startsOn: '2026-09-14',
    endsOn: '2026-12-18',
    year: 2026,
    beatCount: 7,
    stateOf: autumnState,
  },
]

/** Beats 1 to 3 are done, beat 4 is the demo surveyor's and a third done, the others are under way. */
function autumnState(beat: number, place: number, count: number, draw: number): SheetState | null {
  const done = [1, 1, 0.92, 0.35, 0.6, 0.2, 0][beat] ?? 0
  if (place >= done * count) return null
  if (beat < 2) return 'checked'
  if (draw < 0.02) return 'sent-back'
  return draw < 0.7 ? 'checked' : 'handed-in'
}
