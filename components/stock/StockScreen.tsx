import { AgePyramid } from '@/components/charts/AgePyramid'
import { Course } from '@/components/charts/Course'
import { ReceiptFigure } from '@/components/receipts/ReceiptFigure'
import { receiptHref } from '@/components/receipts/receiptHref'
import { RunReport } from '@/components/runs/RunReport'
import { AppText } from '@/components/ui/AppText'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { PERIOD_IDS, STRUCTURES, USES } from '@/shared/compute/factors/vocabulary'
import { formatArea, formatDecimal, formatMass, formatMassRange } from '@/shared/format'
import type { RunResult, RunSummary } from '@/shared/schemas/run'
import { agePyramidRows } from './agePyramidRows'
import { GroupTable } from './GroupTable'
import { MaterialTable } from './MaterialTable'

/** What stands in a district, by material, use, structure and period. */
export function StockScreen() {
  const { t } = useMessages()
  return (
    <RunReport title={t('stock.title')}>
      {(run, result) =>
        result.basis.computedCount === 0 ? (
          <EmptyState title={t('stock.nothing')} text={t('stock.nothingText')} />
        ) : (
          <StockReport run={run} result={result} />
        )
      }
    </RunReport>
  )
}

interface StockReportProps {
  readonly run: RunSummary
  readonly result: RunResult
}

function StockReport({ run, result }: StockReportProps) {
  const { t } = useMessages()
  const { cells } = result.stock
  const named = <Word extends string>(words: readonly Word[], name: (word: Word) => string) => {
    const names = new Map<string, string>(words.map((word) => [word, name(word)]))
    return (key: string): string => names.get(key) ?? t('common.notKnown')
  }
  return (
    <>
      <StockTotal run={run} result={result} />
      <MaterialTable run={run} result={result} />
      <GroupTable
        run={run}
        title={t('stock.byUse')}
        dimension="use"
        cells={cells}
        nameOf={named(USES, (use) => t(`vocabulary.use.${use}`))}
      />
      <GroupTable
        run={run}
        title={t('stock.byStructure')}
        dimension="structure"
        cells={cells}
        nameOf={named(STRUCTURES, (structure) => t(`vocabulary.structure.${structure}`))}
      />
      <GroupTable
        run={run}
        title={t('stock.byPeriod')}
        dimension="period"
        cells={cells}
        nameOf={named(PERIOD_IDS, (period) => t(`vocabulary.period.${period}`))}
      />
      <StockAges result={result} />
    </>
  )
}

function StockTotal({ run, result }: StockReportProps) {
  const { t, locale } = useMessages()
  const { stock, basis } = result
  const parts = stock.byMaterial
    .map(({ material, band }) => ({ material, massKg: band.meanKg }))
    .filter(({ massKg }) => massKg > 0)
    .sort((one, other) => other.massKg - one.massKg)
  return (
    <Panel title={run.districtName} note={t('common.buildings', { count: basis.computedCount })}>
      <ReceiptFigure
        text={`${formatMass(stock.total.meanKg, locale)} ${t('stock.standing')}`}
        what={`${run.districtName} ${t('stock.standing')}`}
        href={receiptHref({ runId: run.runId, kind: 'stock' })}
      />
      <AppText soft>
        {`${t('stock.range', { range: formatMassRange(stock.total.p10Kg, stock.total.p90Kg, locale) })} · ${t(
          'stock.perFloorArea',
          { figure: formatDecimal(stock.total.meanKg / basis.computedFloorAreaM2, locale, 0) },
        )}`}
      </AppText>
      <Course parts={parts} of={t('stock.of', { district: run.districtName })} />
    </Panel>
  )
}

function StockAges({ result }: Pick<StockReportProps, 'result'>) {
  const { t, locale } = useMessages()
  const { cells } = result.stock
  const unknownM2 = cells
    .filter(({ period }) => period === 'unknown')
    .reduce((sum, { floorAreaM2 }) => sum + floorAreaM2, 0)
  const area = (areaM2: number): string => formatArea(areaM2, locale)
  return (
    <Panel title={t('stock.agePyramid')} note={t('stock.pyramidNote')}>
      <AgePyramid
        title={t('stock.agePyramid')}
        rows={agePyramidRows(cells).map(({ period, masonryM2, otherM2 }) => ({
          key: period,
          label: t(`vocabulary.period.${period}`),
          left: masonryM2,
          right: otherM2,
        }))}
        leftHead={t('stock.masonry')}
        rightHead={t('stock.otherStructures')}
        formatLeft={area}
        formatRight={area}
      />
      {unknownM2 > 0 ? <AppText soft>{t('stock.unknownPeriod', { floorArea: area(unknownM2) })}</AppText> : null}
    </Panel>
  )
}
