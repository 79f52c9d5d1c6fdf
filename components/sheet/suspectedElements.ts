import { hazardSuspicions } from '@/shared/compute/waste/hazardSuspicions'
import type { Component } from '@/shared/compute/factors/vocabulary'
import { deriveSheet } from '@/shared/schemas/deriveSheet'
import type { ConstructionYear, SheetAnswers } from '@/shared/schemas/sheet'

export interface SuspectedElement {
  /** What is kept of it when signs are seen. */
  readonly key: string
  readonly component: Component
  /** False where the age is not known, or it may only have been added later. */
  readonly isOfItsTime: boolean
}

/** What to suspect by age and element. At an age that is not known everything is to be suspected. */
export function suspectedElements(answers: SheetAnswers): readonly SuspectedElement[] {
  const construction = intervalOf(answers.constructionYear)
  const refurbishments = (answers.refurbishments?.done ?? []).flatMap(({ component, year }) => {
    const years = intervalOf(year)
    return years === 'unknown' ? [] : [{ components: [component], years }]
  })
  const found = hazardSuspicions({ construction, refurbishments }).flatMap(({ row, because }): SuspectedElement[] => {
    const [component] = row.components
    const key = `${row.substance}: ${row.element}`.slice(0, 120)
    const isOfItsTime = because === 'built-then' || because === 'refurbished-then'
    return component ? [{ key, component, isOfItsTime }] : []
  })
  return [...new Map(found.map((one) => [one.key, one])).values()]
}

/** Half-open; a year that is half typed counts as not known. */
function intervalOf(year: ConstructionYear | undefined): { fromYear: number; toYear: number } | 'unknown' {
  const { yearFrom, yearTo } = deriveSheet(year ? { constructionYear: year } : {})
  if (yearFrom === null || yearTo === null || yearFrom > yearTo || yearFrom < 1000) return 'unknown'
  return { fromYear: yearFrom, toYear: yearTo + 1 }
}
