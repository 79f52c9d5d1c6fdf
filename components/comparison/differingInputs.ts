import type { RunSummary, Scenario } from '@/shared/schemas/run'

/** An input of runs by its name, and what it is in each of them. */
export interface InputRow {
  readonly input: InputName
  /** One a run, in their order. */
  readonly values: readonly string[]
  readonly differs: boolean
}

const READERS = {
  district: ({ districtName }) => districtName,
  round: ({ roundName }) => roundName,
  surveyYear: ({ surveyYear }) => String(surveyYear),
  edition: ({ editionNumber }) => String(editionNumber),
  engine: ({ engineVersion }) => engineVersion,
  horizon: ({ scenario }) => String(scenario.horizonYears),
  yearOffset: ({ scenario }) => String(scenario.yearOffset),
  hazardMultiplier: ({ scenario }) => String(scenario.hazardMultiplier),
  conditionCounts: ({ scenario }) => String(scenario.appliesHazardMultipliers),
  lifetimes: ({ scenario }) => scenario.lifetimeOverrides.map(lifetimeText).join('; ') || '–',
} as const satisfies Readonly<Record<string, (run: RunSummary) => string>>

export type InputName = keyof typeof READERS

/**
 * Inputs of several runs side by side, those that differ first: what differs in the figures comes from them, and from the
 * sheets that were checked between the runs.
 *
 * @param runs two or more
 */
export function differingInputs(runs: readonly RunSummary[]): InputRow[] {
  const rows = Object.entries(READERS).map(([input, read]): InputRow => {
    const values = runs.map(read)
    // the keys of the object above are the names
    return { input: input as InputName, values, differs: new Set(values).size > 1 }
  })
  return [...rows.filter(({ differs }) => differs), ...rows.filter(({ differs }) => !differs)]
}

function lifetimeText({ use, model, meanYears, sdYears }: Scenario['lifetimeOverrides'][number]): string {
  return `${use}: ${model} ${meanYears} ± ${sdYears}`
}
