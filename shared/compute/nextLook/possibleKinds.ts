import { periodOfYear } from '@/shared/compute/factors/periodOfYear'
import { UNKNOWN } from '@/shared/compute/factors/vocabulary'
import type { KnownKind, PossibleKind, Sighting } from './nextLook.types'

/** Fewer buildings than these say too little of what another one is: common practice. */
const LEAST_ALIKE = 5
/** Years taken where nothing of the district is known, as in a run. */
const NOTHING_KNOWN_SPAN_YEARS = 120
const SPAN_STEP_YEARS = 5

type Attribute = 'use' | 'structure' | 'year'
/** What likeness gives up, the least telling first. */
const STEPS: readonly (readonly Attribute[])[] = [
  [],
  ['structure'],
  ['year'],
  ['structure', 'year'],
  ['use'],
  ['use', 'structure'],
  ['use', 'year'],
  ['use', 'structure', 'year'],
]

/**
 * The kinds a building may turn out to be: what is known stays, the rest is as among the recorded buildings of the
 * district that agree in what is known, at least five of them; likeness gives way by structure, then year, then use.
 * The weight of a kind is its share among them.
 *
 * @param sightings recorded buildings whose use, structure and year are known
 * @param surveyYear last year a building may be of, where nothing else says so
 * @returns at least one kind; weights add up to 1
 * @see the district's own distribution stands for what is not known, as in `computeDistrict`.
 * @example
 * possibleKinds({ use: 'office', structure: 'hybrid', yearFrom: 1980, yearTo: 1980 }, [], 2026) // => [{ weight: 1, use: 'office', structure: 'hybrid', constructionYear: 1980 }]
 */
export function possibleKinds(known: KnownKind, sightings: readonly Sighting[], surveyYear: number): PossibleKind[] {
  const alike = alikeTo(known, sightings)
  const kinds = new Map<string, { -readonly [Key in keyof PossibleKind]: PossibleKind[Key] }>()
  let whole = 0
  for (const sighting of alike.length > 0 ? alike : nothingSeen(known, surveyYear)) {
    const kind = {
      weight: sighting.count,
      use: isKnown(known.use) ? known.use : sighting.use,
      structure: isKnown(known.structure) ? known.structure : sighting.structure,
      constructionYear: yearWithin(known, sighting.constructionYear),
    }
    whole += kind.weight
    const key = `${kind.use}|${kind.structure}|${kind.constructionYear}`
    const same = kinds.get(key)
    if (same) same.weight += kind.weight
    else kinds.set(key, kind)
  }
  return [...kinds.values()].map((kind) => ({ ...kind, weight: kind.weight / whole }))
}

function alikeTo(known: KnownKind, sightings: readonly Sighting[]): readonly Sighting[] {
  for (const dropped of STEPS) {
    const isDropped = (attribute: Attribute) => dropped.includes(attribute)
    const alike = sightings.filter(
      ({ use, structure, constructionYear }) =>
        (isDropped('use') || !isKnown(known.use) || use === known.use) &&
        (isDropped('structure') || !isKnown(known.structure) || structure === known.structure) &&
        (isDropped('year') || isYearAlike(known, constructionYear)),
    )
    let count = 0
    for (const sighting of alike) count += sighting.count
    if (count >= LEAST_ALIKE) return alike
  }
  return sightings
}

/** Of the range; for a single year, of its period. */
function isYearAlike({ yearFrom, yearTo }: KnownKind, year: number): boolean {
  if (yearFrom === null || yearTo === null) return true
  if (yearFrom === yearTo) return periodOfYear(year) === periodOfYear(yearFrom)
  return year >= yearFrom && year <= yearTo
}

function yearWithin({ yearFrom, yearTo }: KnownKind, year: number): number {
  if (yearFrom === null || yearTo === null) return year
  return year >= yearFrom && year <= yearTo ? year : Math.round((yearFrom + yearTo) / 2)
}

function nothingSeen({ yearFrom }: KnownKind, surveyYear: number): Sighting[] {
  const steps = yearFrom === null ? NOTHING_KNOWN_SPAN_YEARS / SPAN_STEP_YEARS : 1
  return Array.from({ length: steps }, (_, step) => ({
    use: UNKNOWN,
    structure: UNKNOWN,
    constructionYear: surveyYear - step * SPAN_STEP_YEARS,
    count: 1,
  }))
}

function isKnown<Word extends string>(word: Word | null): word is Word {
  return word !== null && word !== UNKNOWN
}
