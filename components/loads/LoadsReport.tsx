import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Select } from '@/components/ui/Select'
import { SPACE } from '@/components/ui/theme/tokens'
import type { LoadsAhead } from '@/shared/api/publications'
import { formatYearRange } from '@/shared/format'
import { codeTotals, linesBetween } from './codeTotals'
import { LoadSources } from './LoadSources'
import { WasteTable } from './WasteTable'

/** Years that are shown at first. */
const FIRST_YEARS = 10

/** The loads of a span of years: totals by code, then year by year, then where the densities come from. */
export function LoadsReport({ loads }: { readonly loads: LoadsAhead }) {
  const { t } = useMessages()
  const { years } = loads
  const [wantedFrom, setFrom] = useState<number | null>(null)
  const [wantedTo, setTo] = useState<number | null>(null)
  const fromYear = wantedFrom ?? years[0] ?? 0
  const toYear = Math.max(fromYear, wantedTo ?? years[FIRST_YEARS - 1] ?? years.at(-1) ?? 0)
  const lines = linesBetween(loads.lines, fromYear, toYear)
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
          rows={codeTotals(lines)}
          hasYears={false}
          fileName={`${name}-totals.csv`}
        />
        <AppText soft>{t('loads.totalsNote')}</AppText>
      </Panel>
      <Panel title={t('loads.byYear')} note={span}>
        <WasteTable label={t('loads.byYear')} rows={lines} hasYears fileName={`${name}-by-year.csv`} />
      </Panel>
      <LoadSources loads={loads} />
    </>
  )
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.medium },
  field: { flexGrow: 1, flexBasis: 120, maxWidth: 240 },
})
