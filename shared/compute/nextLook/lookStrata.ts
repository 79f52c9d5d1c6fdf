import type { PlannedStratum } from '@/shared/compute/survey/allocation'

export interface LookStratum<Name extends string> extends PlannedStratum {
  readonly stratum: Name
}

/**
 * Strata of buildings not looked at yet, with the spread a sample of them will meet:
 *
 *     S² = mean of the expected falls + variance of the means
 *
 * within the stratum: what is in doubt of each, and how much they differ as far as is known.
 *
 * @returns one a stratum, by falling N·S; those without any spread are left out, for there a sample has nothing to find
 * @see Cochran, W. G. (1977). Sampling Techniques, 3rd ed., §5.5 (optimum allocation).
 * @example
 * lookStrata([{ stratum: 'office', meanKg: 2, wholeKg2: 3 }, { stratum: 'office', meanKg: 4, wholeKg2: 3 }]) // => [{ stratum: 'office', frameCount: 2, sd: 2 }]
 */
export function lookStrata<Name extends string>(
  looks: readonly { readonly stratum: Name; readonly meanKg: number; readonly wholeKg2: number }[],
): LookStratum<Name>[] {
  const groups = new Map<Name, { count: number; sum: number; squares: number; falls: number }>()
  for (const { stratum, meanKg, wholeKg2 } of looks) {
    const group = groups.get(stratum) ?? { count: 0, sum: 0, squares: 0, falls: 0 }
    group.count += 1
    group.sum += meanKg
    group.squares += meanKg ** 2
    group.falls += wholeKg2
    groups.set(stratum, group)
  }
  return [...groups]
    .map(([stratum, { count, sum, squares, falls }]) => ({
      stratum,
      frameCount: count,
      sd: Math.sqrt(falls / count + Math.max(0, squares / count - (sum / count) ** 2)),
    }))
    .filter(({ sd }) => sd > 0)
    .sort((a, b) => b.frameCount * b.sd - a.frameCount * a.sd)
}
