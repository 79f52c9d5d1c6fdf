/** A stretch of a course that one material takes. */
export interface CourseStretch {
  /** Place in the parts that were handed in. */
  readonly part: number
  readonly fromPx: number
  readonly toPx: number
}

/**
 * Widths of a composition laid out over a bar, in the order given: each by its mass, none that has mass narrower than
 * the least that can be seen. What the narrow ones take beyond their share, the wide ones give in proportion.
 *
 * @param massesKg masses [kg], ≥ 0; what is not a positive number takes no room
 * @param widthPx width of the bar [px]
 * @param leastPx least width of a part [px]; shrinks when the parts would not fit
 * @returns stretches from 0 to `widthPx` without gaps; none when there is no mass
 * @example courseStretches([3, 1], 100, 4).map(({ toPx }) => toPx) // => [75, 100]
 */
export function courseStretches(massesKg: readonly number[], widthPx: number, leastPx: number): CourseStretch[] {
  const laid = massesKg
    .map((massKg, part) => ({ massKg, part }))
    .filter(({ massKg }) => massKg > 0 && massKg < Infinity)
  const least = Math.min(leastPx, widthPx / Math.max(1, laid.length))
  const widths = widthsBy(
    laid.map(({ massKg }) => massKg),
    widthPx,
    least,
  )
  let fromPx = 0
  return laid.map(({ part }, place) => {
    const isLast = place === laid.length - 1
    const toPx = isLast ? widthPx : fromPx + (widths[place] ?? 0)
    const stretch = { part, fromPx, toPx }
    fromPx = toPx
    return stretch
  })
}

function widthsBy(masses: readonly number[], widthPx: number, least: number): number[] {
  const isNarrow = masses.map(() => false)
  for (;;) {
    const narrowCount = isNarrow.filter(Boolean).length
    const wideMass = masses.reduce((sum, mass, place) => (isNarrow[place] ? sum : sum + mass), 0)
    const room = widthPx - narrowCount * least
    const widths = masses.map((mass, place) => (isNarrow[place] ? least : (room * mass) / wideMass))
    const tooNarrow = widths.findIndex((width, place) => !isNarrow[place] && width < least)
    if (tooNarrow === -1 || narrowCount === masses.length - 1) return widths
    isNarrow[tooNarrow] = true
  }
}
