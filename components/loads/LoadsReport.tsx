import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { loadReceiptHref } from '@/components/receipts/loadReceiptHref'
import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Select } from '@/components/ui/Select'
import { SPACE } from '@/components/ui/theme/tokens'
import type { LoadsAhead } from '@/shared/api/publications'
import { formatYearRange } from '@/shared/format'
import type { YardPlan } from '@/shared/schemas/yardPlan'
import { CapacityPanel } from './CapacityPanel'
import { codeTotals, linesBetween } from './codeTotals'
import { LoadSources } from './LoadSources'
import { RecoveryPanel } from './RecoveryPanel'
import { WasteTable } from './WasteTable'

/** Years that are shown at first. */
const FIRST_YEARS = 10

interface LoadsReportProps {
  readonly loads: LoadsAhead
  readonly plan: YardPlan
  readonly isKeeping: boolean
  readonly onKeep: (plan: YardPlan) => void
}

/** The loads of a span of years: by code, beside my plant, what I recover, year by year, and where densities come from. */
export function LoadsReport({ loads, plan, isKeeping, onKeep }: LoadsReportProps) {
  const { t } = useMessages()
  const { years } = loads
  const [wantedFrom, setFrom] = useState<number | null>(null)
  const [wantedTo, setTo] = useState<number | null>(null)
  const fromYear = wantedFrom ?? years[0] ?? 0
  const toYear = Math.max(fromYear, wantedTo ?? years[FIRST_YEARS - 1] ?? years.at(-1) ?? 0)
  const lines = linesBetween(loads.lines, fromYear, toYear)
  const totals = codeTotals(lines)
  const span = formatYearRange(fromYear, toYear)
  const name = `loads-ahead-run-${loads.publication.runNumber}`
  const toOption = (year: number) => ({ value: String(year), label: String(year) })
  return (
    <>
      <Panel title={t('loads.range')}>
        <View style={styles.row}>
          <View style={styles.field}>
            <Select
              label={t('loads.yearsFrom')}
              options={years.map(toOption)}
              value={String(fromYear)}
              onChange={(year) => setFrom(Number(year))}
            />
          </View>
          <View style={styles.field}>
            <Select
              label={t('loads.yearsTo')}
              options={years.filter((year) => year >= fromYear).map(toOption)}
              value={String(toYear)}
              onChange={(year) => setTo(Number(year))}
            />
          </View>
        </View>
      </Panel>
      <Panel title={t('loads.totals', { years: span })}>
        <WasteTable
          label={t('loads.totals', { years: span })}
          rows={totals}
          hasYears={false}
          fileName={`${name}-totals.csv`}
        />
        <AppText soft>{t('loads.totalsNote')}</AppText>
      </Panel>
      <CapacityPanel lines={lines} capacityTPerYear={plan.capacityTPerYear} fileName={`${name}-plant.csv`} />
      <RecoveryPanel totals={totals} plan={plan} isKeeping={isKeeping} onKeep={onKeep} />
      <Panel title={t('loads.byYear')} note={span}>
        <WasteTable
          label={t('loads.byYear')}
          rows={lines}
          hasYears
          fileName={`${name}-by-year.csv`}
          receiptHrefOf={({ code, year }) =>
            loadReceiptHref(loads.publication.publicationId, { code, year, ...loads.fleet })
          }
        />
      </Panel>
      <LoadSources loads={loads} />
    </>
  )
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.medium },
  field: { flexGrow: 1, flexBasis: 120, maxWidth: 240 },
})
