import { AppText } from '@/components/ui/AppText'
import { Badge } from '@/components/ui/Badge'
import { csvText } from '@/components/ui/csvText'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { downloadText } from '@/components/ui/web/downloadText'
import { formatCount, formatMassFigure, formatShare } from '@/shared/format'
import type { CodeComparison } from '@/shared/schemas/listing'
import { comparisonVerdict } from './comparisonVerdict'

interface ComparisonPanelProps {
  readonly comparison: readonly CodeComparison[]
  readonly fileName: string
}

const TONES = { inside: 'good', below: 'attention', above: 'attention', unexpected: 'error' } as const

/** What the weighbridge said beside what was expected, code by code. */
export function ComparisonPanel({ comparison, fileName }: ComparisonPanelProps) {
  const { t, locale } = useMessages()
  const tonnes = (massKg: number): string => formatMassFigure(massKg, locale, 't')
  const isWeighed = comparison.some(({ weighedKg }) => weighedKg !== null)
  if (!isWeighed) {
    return (
      <Panel title={t('listed.comparison')}>
        <AppText soft>{t('listed.nothingWeighed')}</AppText>
      </Panel>
    )
  }
  return (
    <Panel title={t('listed.comparison')}>
      <DataTable
        label={t('listed.comparison')}
        rows={comparison}
        rowKey={({ code }) => code}
        onSaveCsv={() =>
          downloadText(
            fileName,
            csvText([
              ['waste_code', 'text', 'expected_low_kg', 'expected_kg', 'expected_high_kg', 'weighed_kg', 'tickets'],
              ...comparison.map(({ code, text, expectedKg, weighedKg, tickets }) => [
                code,
                text,
                expectedKg.low,
                expectedKg.likely,
                expectedKg.high,
                weighedKg,
                tickets,
              ]),
            ]),
            'text/csv',
          )
        }
        columns={[
          { key: 'code', head: t('loads.code'), cell: ({ code }) => code, sortBy: ({ code }) => code },
          { key: 'text', head: t('loads.what'), cell: ({ text }) => text, weight: 3, minWidth: 150 },
          { key: 'low', head: t('loads.massLow'), align: 'right', cell: ({ expectedKg }) => tonnes(expectedKg.low) },
          { key: 'likely', head: t('loads.mass'), align: 'right', cell: ({ expectedKg }) => tonnes(expectedKg.likely) },
          { key: 'high', head: t('loads.massHigh'), align: 'right', cell: ({ expectedKg }) => tonnes(expectedKg.high) },
          {
            key: 'weighed',
            head: t('listed.weighed'),
            align: 'right',
            cell: ({ weighedKg }) => (
              <AppText kind="number" weight="semibold" align="right">
                {weighedKg === null ? '–' : tonnes(weighedKg)}
              </AppText>
            ),
          },
          {
            key: 'tickets',
            head: t('listed.tickets'),
            align: 'right',
            cell: ({ tickets }) => formatCount(tickets, locale),
          },
          {
            key: 'ratio',
            head: t('listed.ratio'),
            align: 'right',
            cell: ({ weighedKg, expectedKg }) =>
              weighedKg === null || expectedKg.likely === 0 ? '–' : formatShare(weighedKg / expectedKg.likely, locale),
          },
          {
            key: 'verdict',
            head: t('listed.band'),
            weight: 2,
            minWidth: 130,
            cell: (row) => {
              const verdict = comparisonVerdict(row)
              return verdict === null ? (
                t('listed.notWeighed')
              ) : (
                <Badge tone={TONES[verdict]} label={t(`listed.verdict.${verdict}`)} />
              )
            },
          },
        ]}
      />
      <AppText soft>{t('listed.comparisonNote')}</AppText>
    </Panel>
  )
}
