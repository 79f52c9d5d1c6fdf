/**
 * A reference for every outline, unique among all. Those without one get R-0001, R-0002, … after the highest that is
 * there; one that comes again in the same file gets its count behind it.
 *
 * @param given the references of the file in order, null where it has none
 * @param taken references that the district has already
 */
export function makeReferences(given: readonly (string | null)[], taken: ReadonlySet<string>): string[] {
  const used = new Set(taken)
  const counts = new Map<string, number>()
  let highest = [...taken, ...given].reduce((most, reference) => Math.max(most, numberOf(reference)), 0)
  return given.map((reference) => {
    const made = reference === null ? `R-${String(++highest).padStart(4, '0')}` : firstFree(reference, used, counts)
    used.add(made)
    return made
  })
}

function firstFree(reference: string, used: ReadonlySet<string>, counts: Map<string, number>): string {
  let candidate = reference
  while (used.has(candidate)) {
    const count = (counts.get(reference) ?? 1) + 1
    counts.set(reference, count)
    candidate = `${reference} (${count})`
  }
  return candidate
}

function numberOf(reference: string | null): number {
  return Number(/^R-(\d{1,9})$/.exec(reference ?? '')?.[1] ?? 0)
}
