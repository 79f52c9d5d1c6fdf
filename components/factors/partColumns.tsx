import type { Column } from '@/components/ui/DataTable'
import { formatCount, formatDecimal, formatRange, formatShare, formatYearRange } from '@/shared/format'
import type { Messages } from '@/shared/messages/messages.types'
import type { EditionRows, LifetimeRow, SuspicionRow, WasteCodeRow } from '@/shared/schemas/factorBook'
import { factorNames } from './factorNames'
import { sourceColumns } from './sourceColumns'

type DensityRow = EditionRows['densities'][number]

/** How long buildings and their parts last. */
export function lifetimeColumns(messages: Messages): Column<LifetimeRow>[] {
  const { t, locale } = messages
  const names = factorNames(messages)
  return [
    {
      key: 'use',
      head: t('factorBook.use'),
      cell: ({ use }) => names.use(use),
      sortBy: ({ use }) => names.use(use),
      minWidth: 130,
    },
    {
      key: 'structure',
      head: t('factorBook.structure'),
      cell: ({ structure }) => names.structure(structure),
      minWidth: 130,
    },
    {
      key: 'component',
      head: t('factorBook.component'),
      cell: ({ component }) => names.component(component),
      minWidth: 110,
    },
    { key: 'model', head: t('factorBook.model'), cell: ({ model }) => model, minWidth: 110 },
    {
      key: 'mean',
      head: t('factorBook.meanYears'),
      cell: ({ meanYears }) => formatDecimal(meanYears, locale, 1),
      sortBy: ({ meanYears }) => meanYears,
      align: 'right',
    },
    {
      key: 'sd',
      head: t('factorBook.sdYears'),
      cell: ({ sdYears }) => formatDecimal(sdYears, locale, 1),
      align: 'right',
    },
    {
      key: 'cv',
      head: t('factorBook.sharedCv'),
      cell: ({ sharedCv }) => formatShare(sharedCv, locale),
      align: 'right',
    },
    ...sourceColumns<LifetimeRow>(messages),
  ]
}

/** How heavy a loose cubic metre of waste is. */
export function densityColumns(messages: Messages): Column<DensityRow>[] {
  const { t, locale } = messages
  const names = factorNames(messages)
  return [
    {
      key: 'material',
      head: t('factorBook.material'),
      cell: ({ material }) => names.material(material),
      sortBy: ({ material }) => names.material(material),
      minWidth: 130,
    },
    { key: 'load', head: t('factorBook.load'), cell: ({ load }) => load, weight: 2, minWidth: 150 },
    { key: 'state', head: t('factorBook.loadState'), cell: ({ state }) => state },
    {
      key: 'density',
      head: t('factorBook.density'),
      cell: ({ lowKgPerM3, highKgPerM3 }) =>
        formatRange(lowKgPerM3, highKgPerM3, (value) => formatCount(value, locale)),
      sortBy: ({ lowKgPerM3 }) => lowKgPerM3,
      align: 'right',
      minWidth: 110,
    },
    ...sourceColumns<DensityRow>(messages),
  ]
}

/** Which waste code a material goes under. */
export function wasteCodeColumns(messages: Messages): Column<WasteCodeRow>[] {
  const { t } = messages
  const names = factorNames(messages)
  return [
    { key: 'code', head: t('factorBook.code'), cell: ({ code }) => code, sortBy: ({ code }) => code, minWidth: 100 },
    { key: 'text', head: t('factorBook.text'), cell: ({ text }) => text, weight: 3, minWidth: 220 },
    {
      key: 'material',
      head: t('factorBook.material'),
      cell: ({ material }) => names.material(material),
      minWidth: 120,
    },
    {
      key: 'hazardous',
      head: t('factorBook.hazardous'),
      cell: ({ isHazardous }) => t(isHazardous ? 'common.yes' : 'common.no'),
    },
    {
      key: 'mirror',
      head: t('factorBook.mirror'),
      cell: ({ mirrorHazardousCode }) => mirrorHazardousCode ?? '',
      minWidth: 110,
    },
    ...sourceColumns<WasteCodeRow>(messages),
  ]
}

/** What may be in which element of which age. */
export function suspicionColumns(messages: Messages): Column<SuspicionRow>[] {
  const { t } = messages
  const names = factorNames(messages)
  return [
    {
      key: 'substance',
      head: t('factorBook.substance'),
      cell: ({ substance }) => substance,
      sortBy: ({ substance }) => substance,
      minWidth: 120,
    },
    { key: 'component', head: t('factorBook.component'), cell: ({ component }) => names.component(component) },
    { key: 'element', head: t('factorBook.element'), cell: ({ element }) => element, weight: 2, minWidth: 150 },
    {
      key: 'years',
      head: t('factorBook.years'),
      cell: (row) => suspicionYears(row, messages),
      sortBy: ({ fromYear }) => fromYear,
      minWidth: 100,
    },
    { key: 'suspicion', head: t('factorBook.suspicion'), cell: ({ suspicion }) => suspicion, weight: 3, minWidth: 200 },
    { key: 'caution', head: t('factorBook.caution'), cell: ({ caution }) => caution, weight: 3, minWidth: 200 },
    ...sourceColumns<SuspicionRow>(messages),
  ]
}

function suspicionYears({ fromYear, toYear }: SuspicionRow, { t }: Messages): string {
  if (fromYear !== null && toYear !== null) return formatYearRange(fromYear, toYear)
  if (toYear !== null) return t('factorBook.before', { year: toYear })
  if (fromYear !== null) return t('factorBook.from', { year: fromYear })
  return t('factorBook.anyYear')
}
