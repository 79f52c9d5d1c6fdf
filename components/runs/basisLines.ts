import { formatArea, formatCount, formatDecimal, formatShare } from '@/shared/format'
import type { Messages } from '@/shared/messages/messages.types'
import type { RunResult, RunSummary } from '@/shared/schemas/run'
import { doubtSentence } from './doubtSentence'

/** One statement a reader must find beside the figures. */
export interface BasisLine {
  readonly key: string
  readonly label: string
  readonly value: string
}

/** Everything a reader of a run must be told, in the order of the panel. */
export function basisLines(run: RunSummary, result: RunResult, messages: Messages): BasisLine[] {
  const { t } = messages
  const { basis } = result
  return [
    ...methodLines(run, result, messages),
    ...coverageLines(result, messages),
    {
      key: 'overdue',
      label: t('runs.overdue'),
      value: t('runs.overdueValue', { count: basis.overdueCount }),
    },
    {
      key: 'rate',
      label: t('runs.rate'),
      value: t('runs.rateValue', { rate: rateText(basis.impliedDemolitionRatePerYear, messages.locale) }),
    },
    { key: 'band', label: t('runs.band'), value: t('runs.bandValue') },
    {
      key: 'doubtStock',
      label: t('runs.doubtStock'),
      value: doubtSentence(basis.varianceSharesOfStock, messages),
    },
    {
      key: 'doubtFlow',
      label: t('runs.doubtFlow'),
      value: doubtSentence(basis.varianceSharesOfTenYearFlow, messages),
    },
  ]
}

/** A rate per year with two places, for the band it is judged by is 0.1 to 1 %. */
export function rateText(ratePerYear: number, locale: string): string {
  return `${formatDecimal(ratePerYear * 100, locale, 2)}\u00a0%`
}

function methodLines(run: RunSummary, { basis }: RunResult, { t, locale }: Messages): BasisLine[] {
  const { yearOffset, appliesHazardMultipliers, hazardMultiplier } = run.scenario
  const offset = yearOffset === 1 ? 'runs.offset1' : yearOffset === 0 ? 'runs.offset0' : 'runs.offset05'
  const hazards = [
    t(appliesHazardMultipliers ? 'runs.hazardsOn' : 'runs.hazardsOff'),
    ...(hazardMultiplier === 1 ? [] : [t('runs.multiplier', { factor: formatDecimal(hazardMultiplier, locale, 2) })]),
  ]
  return [
    {
      key: 'area',
      label: t('runs.areaBasis'),
      value: t('runs.areaBasisValue', {
        basis: t(`vocabulary.areaBasis.${basis.areaBasis}`),
        floorArea: formatArea(basis.computedFloorAreaM2, locale),
      }),
    },
    {
      key: 'edition',
      label: t('runs.editionLabel'),
      value: t('runs.editionValue', { number: run.editionNumber }),
    },
    { key: 'engine', label: t('runs.engine'), value: run.engineVersion },
    { key: 'offset', label: t('runs.convention'), value: t(offset) },
    { key: 'surveyYear', label: t('runs.surveyYear'), value: String(run.surveyYear) },
    { key: 'model', label: t('runs.model'), value: t('runs.modelValue', { year: run.surveyYear }) },
    { key: 'hazards', label: t('runs.hazards'), value: hazards.join(', ') },
  ]
}

function coverageLines({ basis, stock }: RunResult, { t, locale }: Messages): BasisLine[] {
  const count = (value: number): string => formatCount(value, locale)
  const missing = stock.byMaterial.filter(({ missingCount }) => missingCount > 0)
  return [
    {
      key: 'count',
      label: t('runs.coverageCount'),
      value: t('runs.coverageCountValue', {
        computed: count(basis.computedCount),
        frame: count(basis.frameCount),
        share: formatShare(basis.frameCount > 0 ? basis.computedCount / basis.frameCount : 0, locale),
      }),
    },
    {
      key: 'footprint',
      label: t('runs.coverageFootprint'),
      value: t('runs.coverageFootprintValue', {
        computed: formatArea(basis.computedFootprintM2, locale),
        frame: formatArea(basis.frameFootprintM2, locale),
        share: formatShare(basis.frameFootprintM2 > 0 ? basis.computedFootprintM2 / basis.frameFootprintM2 : 0, locale),
      }),
    },
    {
      key: 'notComputed',
      label: t('runs.notComputed'),
      value: t('runs.notComputedValue', {
        outstanding: count(basis.outstandingCount),
        inaccessible: count(basis.inaccessibleCount),
        notABuilding: count(basis.notABuildingCount),
        cleared: count(basis.clearedCount),
      }),
    },
    {
      key: 'unknown',
      label: t('runs.unknown'),
      value: t('runs.unknownValue', {
        use: count(basis.unknownUseCount),
        structure: count(basis.unknownStructureCount),
        year: count(basis.unknownYearCount),
        storeys: count(basis.unknownStoreysCount),
      }),
    },
    {
      key: 'missing',
      label: t('runs.missingFactors'),
      value:
        missing.length === 0
          ? t('runs.noMissingFactors')
          : missing
              .map(({ material, missingCount }) =>
                t('runs.missingFactorsValue', {
                  material: t(`vocabulary.material.${material}`),
                  count: count(missingCount),
                }),
              )
              .join(', '),
    },
  ]
}
