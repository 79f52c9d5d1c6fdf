import { BandChart, type BandSeries } from '@/components/charts/BandChart'
import { AppText } from '@/components/ui/AppText'
import { Badge } from '@/components/ui/Badge'
import { csvText } from '@/components/ui/csvText'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { downloadText } from '@/components/ui/web/downloadText'
import type { WasteLine } from '@/shared/api/publications'
import { formatMassFigure } from '@/shared/format'
import { capacityYears, type CapacityVerdict } from './capacityYears'

interface CapacityPanelProps {
  readonly lines: readonly WasteLine[]
  /** Null while the contractor has not said it. */
  readonly capacityTPerYear: number | null
  readonly fileName: string
}

const TONES = { fits: 'good', 'may-exceed': 'attention', exceeds: 'error' } as const satisfies Record<
  CapacityVerdict,
  string
>
const KG_PER_T = 1000

/** What comes in each year beside what my plant takes in, and the years in which it is too much. */
export function CapacityPanel({ lines, capacityTPerYear, fileName }: CapacityPanelProps) {
  const { t, locale } = useMessages()
  if (capacityTPerYear === null) {
    return (
      <Panel title={t('loads.capacityTitle')}>
        <AppText soft>{t('loads.capacityUnsaid')}</AppText>
      </Panel>
    )
  }
  const capacityKg = capacityTPerYear * KG_PER_T
  const years = capacityYears(lines, capacityKg)
  const count = (verdict: CapacityVerdict): number => years.filter((year) => year.verdict === verdict).length
  const series: BandSeries[] = [
    { key: 'expected', label: t('loads.expected'), points: years },
    { key: 'capacity', label: t('loads.capacity'), points: years.map(({ year }) => ({ year, likelyKg: capacityKg })) },
  ]
  const tonnes = (massKg: number): string => formatMassFigure(massKg, locale, 't')
  return (
    <Panel title={t('loads.capacityTitle')}>
      <AppText weight="semibold">
        {t('loads.capacityVerdict', { exceeds: count('exceeds'), mayExceed: count('may-exceed'), years: years.length })}
      </AppText>
      <BandChart title={t('loads.capacityTitle')} series={series} />
      <AppText soft>{t('loads.capacityNote')}</AppText>
      <DataTable
        label={t('loads.capacityTitle')}
        rows={years}
        rowKey={({ year }) => String(year)}
        onSaveCsv={() =>
          downloadText(
            fileName,
            csvText([
              ['year', 'mass_low_kg', 'mass_likely_kg', 'mass_high_kg', 'capacity_kg', 'verdict'],
              ...years.map(({ year, lowKg, likelyKg, highKg, verdict }) => [
                year,
                lowKg,
                likelyKg,
                highKg,
                capacityKg,
                verdict,
              ]),
            ]),
            'text/csv',
          )
        }
        columns={[
          { key: 'year', head: t('common.year'), cell: ({ year }) => String(year), sortBy: ({ year }) => year },
          { key: 'low', head: t('loads.massLow'), align: 'right', cell: ({ lowKg }) => tonnes(lowKg) },
          {
            key: 'likely',
            head: t('loads.mass'),
            align: 'right',
            cell: ({ likelyKg }) => tonnes(likelyKg),
            sortBy: ({ likelyKg }) => likelyKg,
          },
          { key: 'high', head: t('loads.massHigh'), align: 'right', cell: ({ highKg }) => tonnes(highKg) },
          {
            key: 'verdict',
            head: t('loads.plant'),
            cell: ({ verdict }) => <Badge tone={TONES[verdict]} label={t(`loads.verdict.${verdict}`)} />,
          },
        ]}
      />
    </Panel>
  )
}
