import type { MessageKey } from '@/shared/messages/messages.types'

/** What the planner has filled in for a new run. */
export interface RunDraft {
  readonly roundId: string | null
  readonly editionId: string | null
  readonly name: string
  readonly horizonYears: number | null
  readonly seed: number | null
  readonly appliesHazardMultipliers: boolean
}

export type DraftFaults = Partial<Record<keyof RunDraft, MessageKey>>

const isWhole = (value: number | null, from: number, to: number): boolean =>
  value !== null && Number.isInteger(value) && value >= from && value <= to

/** What is wrong with a draft, by field; empty when it can be sent. */
export function draftFaults({ roundId, editionId, name, horizonYears, seed }: RunDraft): DraftFaults {
  return {
    ...(roundId === null ? { roundId: 'runs.chooseRound' } : {}),
    ...(editionId === null ? { editionId: 'runs.chooseEdition' } : {}),
    ...(name.trim() === '' ? { name: 'runs.scenarioNameMissing' } : {}),
    ...(isWhole(horizonYears, 1, 200) ? {} : { horizonYears: 'runs.horizonFault' }),
    ...(isWhole(seed, 0, 4_294_967_295) ? {} : { seed: 'runs.seedFault' }),
  }
}

/** The request of a draft without faults. */
export function startBody({ roundId, editionId, name, horizonYears, seed, appliesHazardMultipliers }: RunDraft) {
  return {
    roundId: roundId ?? '',
    editionId: editionId ?? '',
    seed: seed ?? 1,
    scenario: { name: name.trim(), horizonYears: horizonYears ?? 100, appliesHazardMultipliers },
  }
}
