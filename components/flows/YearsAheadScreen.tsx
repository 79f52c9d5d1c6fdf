import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { BandChart } from '@/components/charts/BandChart'
import { Legend } from '@/components/charts/Legend'
import { StackedFlows } from '@/components/charts/StackedFlows'
import { Swatch } from '@/components/charts/Swatch'
import { ReceiptFigure } from '@/components/receipts/ReceiptFigure'
import { receiptHref } from '@/components/receipts/receiptHref'
import { RunReport } from '@/components/runs/RunReport'
import { AppText } from '@/components/ui/AppText'
import { Choice } from '@/components/ui/Choice'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { SPACE } from '@/components/ui/theme/tokens'
import { formatMass, formatMassRange, formatYearRange } from '@/shared/format'
import type { RunResult, RunSummary } from '@/shared/schemas/run'
import { flowMaterials, flowRows, type FlowKind } from './flowRows'
import { ExpectedTable, FlowTable } from './FlowTable'

const HORIZONS = ['10', '30', '100'] as const
type Horizon = (typeof HORIZONS)[number]

/** What will come out of a district, year by year. */
export function YearsAheadScreen() {
  const { t } = useMessages()
  return (
    <RunReport title={t('yearsAhead.title')}>
      {(run, result) =>
        result.basis.computedCount === 0 ? (
          <EmptyState title={t('yearsAhead.nothing')} text={t('yearsAhead.nothingText')} />
        ) : (
          <YearsAheadReport run={run} result={result} />
        )
      }
    </RunReport>
  )
}

interface YearsAheadReportProps {
  readonly run: RunSummary
  readonly result: RunResult
}

function YearsAheadReport({ run, result }: YearsAheadReportProps) {
  const { t } = useMessages()
  const [wantedKind, setKind] = useState<FlowKind>('demolition')
  const [horizon, setHorizon] = useState<Horizon>('30')
  const { yearsAhead } = result
  const hasRefurbishment = yearsAhead.refurbishment.total.meanKg.some((massKg) => massKg > 0)
  const kind = hasRefurbishment ? wantedKind : 'demolition'
  const rows = flowRows(yearsAhead, kind, Number(horizon))
  const materials = flowMaterials(rows)
  return (
    <>
      <Panel>
        <View style={styles.controls}>
          <Choice
            label={t('yearsAhead.flow')}
            options={(['demolition', 'refurbishment', 'both'] as const).map((value) => ({
              value,
              label: t(`yearsAhead.${value}`),
              disabled: value !== 'demolition' && !hasRefurbishment,
            }))}
            value={kind}
            onChange={setKind}
          />
          <Choice
            label={t('yearsAhead.horizon')}
            options={HORIZONS.map((value) => ({ value, label: t('yearsAhead.years', { count: Number(value) }) }))}
            value={horizon}
            onChange={setHorizon}
          />
        </View>
        {hasRefurbishment ? null : <AppText soft>{t('yearsAhead.noRefurbishment')}</AppText>}
      </Panel>
      <Cumulative runId={run.runId} yearsAhead={yearsAhead} yearCount={rows.length} />
      <Panel title={t('yearsAhead.perYear')} note={kind === 'both' ? undefined : t('yearsAhead.perYearNote')}>
        {kind === 'both' ? <AppText soft>{t('yearsAhead.bothNote')}</AppText> : null}
        <StackedFlows
          title={`${t('yearsAhead.perYear')}, ${t(`yearsAhead.${kind}`)}`}
          order={materials}
          flows={rows.map(({ year, massKg, lowKg, highKg }) => ({
            year,
            parts: materials.map((material) => ({ material, massKg: massKg[material] ?? 0 })),
            ...(lowKg === null || highKg === null ? {} : { lowKg, highKg }),
          }))}
        />
        <Legend
          entries={materials.map((material) => ({
            key: material,
            label: t(`vocabulary.material.${material}`),
            mark: <Swatch material={material} />,
          }))}
        />
      </Panel>
      <FlowTable
        rows={rows}
        materials={materials}
        fileName={`run-${run.number}-${kind}-by-year.csv`}
        receipt={kind === 'both' ? undefined : { runId: run.runId, kind }}
      />
      <ExpectedTable rows={rows} fileName={`run-${run.number}-expected-by-year.csv`} />
    </>
  )
}

interface CumulativeProps {
  readonly runId: string
  readonly yearsAhead: RunResult['yearsAhead']
  readonly yearCount: number
}

/** Demolition added up over the years, the band included: bands of single years cannot be added. */
function Cumulative({ runId, yearsAhead, yearCount }: CumulativeProps) {
  const { t, locale } = useMessages()
  const { cumulative } = yearsAhead
  const years = yearsAhead.years.slice(0, yearCount)
  const points = years.map((year, place) => ({
    year,
    likelyKg: cumulative.meanKg[place] ?? 0,
    lowKg: cumulative.p10Kg[place] ?? 0,
    highKg: cumulative.p90Kg[place] ?? 0,
  }))
  const first = points[0]
  const last = points.at(-1)
  if (!first || !last) return null
  return (
    <Panel title={t('yearsAhead.cumulative')}>
      <ReceiptFigure
        text={t('yearsAhead.summaryLikely', { mass: formatMass(last.likelyKg, locale) })}
        what={`${t('yearsAhead.cumulative')}, ${formatYearRange(first.year, last.year)}`}
        href={receiptHref({ runId, kind: 'demolition', fromYear: first.year, toYear: last.year })}
      />
      <AppText soft>
        {t('yearsAhead.summary', {
          range: formatMassRange(last.lowKg, last.highKg, locale),
          years: formatYearRange(first.year, last.year),
        })}
      </AppText>
      <BandChart
        title={t('yearsAhead.cumulative')}
        series={[{ key: 'all', label: t('yearsAhead.cumulativeSeries'), points }]}
      />
    </Panel>
  )
}

const styles = StyleSheet.create({
  controls: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.wide },
})
