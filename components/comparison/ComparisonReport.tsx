import { BandChart } from '@/components/charts/BandChart'
import { LineMark } from '@/components/charts/LineMark'
import { Legend } from '@/components/charts/Legend'
import { rateText } from '@/components/runs/basisLines'
import { MaterialName } from '@/components/runs/MaterialName'
import { AppText } from '@/components/ui/AppText'
import { csvText } from '@/components/ui/csvText'
import { DataTable, type Column } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Panel } from '@/components/ui/Panel'
import { downloadText } from '@/components/ui/web/downloadText'
import { MATERIALS, type Material } from '@/shared/compute/factors/vocabulary'
import {
  formatArea,
  formatCount,
  formatDecimal,
  formatMass,
  formatMassRange,
  formatShare,
  formatYearRange,
} from '@/shared/format'
import type { LoadedRun } from './CompareScreen'
import { decadeRows } from './decadeRows'
import { differingInputs } from './differingInputs'

/** What differs in the inputs, then in stock, flows and key figures; each against the first run. */
export function ComparisonReport({ loaded }: { readonly loaded: readonly LoadedRun[] }) {
  const { t } = useMessages()
  const nameOf = ({ run }: LoadedRun): string => t('runs.number', { number: run.number })
  const isOneDistrict = new Set(loaded.map(({ run }) => run.districtId)).size === 1
  return (
    <>
      {isOneDistrict ? null : <Notice tone="attention" whatHappened={t('comparison.otherDistricts')} />}
      <InputsPanel loaded={loaded} nameOf={nameOf} />
      <KeyFigures loaded={loaded} nameOf={nameOf} />
      <CumulativePanel loaded={loaded} />
      <StockPanel loaded={loaded} nameOf={nameOf} />
      <DecadesPanel loaded={loaded} nameOf={nameOf} />
      <AppText soft>{t('runs.expectation')}</AppText>
    </>
  )
}

interface PartProps {
  readonly loaded: readonly LoadedRun[]
  readonly nameOf: (loaded: LoadedRun) => string
}

function InputsPanel({ loaded, nameOf }: PartProps) {
  const { t } = useMessages()
  const rows = differingInputs(loaded.map(({ run }) => run))
  const worded = (value = ''): string =>
    value === 'true' || value === 'false' ? t(value === 'true' ? 'common.yes' : 'common.no') : value
  return (
    <Panel title={t('comparison.why')} note={t('comparison.whyNote')}>
      <DataTable
        label={t('comparison.why')}
        rows={rows}
        rowKey={({ input }) => input}
        columns={[
          {
            key: 'input',
            head: t('comparison.input'),
            cell: ({ input }) => t(`comparison.inputs.${input}`),
            weight: 2,
            minWidth: 150,
          },
          ...loaded.map((one, place): Column<(typeof rows)[number]> => ({
            key: one.run.runId,
            head: nameOf(one),
            weight: 2,
            minWidth: 120,
            cell: ({ values, differs }) => (
              <AppText weight={differs ? 'semibold' : undefined}>{worded(values[place])}</AppText>
            ),
          })),
        ]}
      />
    </Panel>
  )
}

function KeyFigures({ loaded, nameOf }: PartProps) {
  const { t, locale } = useMessages()
  const rows = [
    {
      key: 'stock',
      values: loaded.map(({ result }) => formatMass(result.stock.total.meanKg, locale)),
    },
    {
      key: 'range',
      values: loaded.map(({ result }) => formatMassRange(result.stock.total.p10Kg, result.stock.total.p90Kg, locale)),
    },
    { key: 'floorArea', values: loaded.map(({ result }) => formatArea(result.basis.computedFloorAreaM2, locale)) },
    {
      key: 'coverage',
      values: loaded.map(
        ({ result: { basis } }) =>
          `${formatCount(basis.computedCount, locale)} / ${formatCount(basis.frameCount, locale)}`,
      ),
    },
    { key: 'rate', values: loaded.map(({ result }) => rateText(result.basis.impliedDemolitionRatePerYear, locale)) },
    { key: 'overdue', values: loaded.map(({ result }) => formatCount(result.basis.overdueCount, locale)) },
  ] as const
  return (
    <Panel title={t('comparison.keyFigures')}>
      <DataTable
        label={t('comparison.keyFigures')}
        rows={rows}
        rowKey={({ key }) => key}
        columns={[
          {
            key: 'figure',
            head: t('comparison.figure'),
            cell: ({ key }) => t(`comparison.figures.${key}`),
            weight: 2,
            minWidth: 150,
          },
          ...loaded.map((one, place): Column<(typeof rows)[number]> => ({
            key: one.run.runId,
            head: nameOf(one),
            align: 'right',
            minWidth: 110,
            cell: ({ values }) => values[place] ?? '',
          })),
        ]}
      />
    </Panel>
  )
}

function CumulativePanel({ loaded }: Pick<PartProps, 'loaded'>) {
  const { t } = useMessages()
  const series = loaded.map(({ run, result: { yearsAhead } }) => ({
    key: run.runId,
    label: t('runs.option', { number: run.number, round: run.roundName, scenario: run.scenario.name }),
    points: yearsAhead.years.map((year, place) => ({
      year,
      likelyKg: yearsAhead.cumulative.meanKg[place] ?? 0,
      lowKg: yearsAhead.cumulative.p10Kg[place] ?? 0,
      highKg: yearsAhead.cumulative.p90Kg[place] ?? 0,
    })),
  }))
  return (
    <Panel title={t('yearsAhead.cumulative')} note={t('common.charts.p10p90')}>
      <BandChart title={t('yearsAhead.cumulative')} series={series} />
      <Legend
        entries={series.map(({ key, label }, place) => ({
          key,
          label,
          mark: <LineMark place={place} />,
        }))}
      />
      <AppText soft>{t('comparison.bandNote')}</AppText>
    </Panel>
  )
}

function StockPanel({ loaded, nameOf }: PartProps) {
  const { t, locale } = useMessages()
  const massIn = ({ result }: LoadedRun, material: Material): number | null =>
    result.stock.byMaterial.find((row) => row.material === material)?.band.meanKg ?? null
  const rows = MATERIALS.map((material) => ({ material, massesKg: loaded.map((one) => massIn(one, material)) })).filter(
    ({ massesKg }) => massesKg.some((massKg) => (massKg ?? 0) > 0),
  )
  const tonnes = (massKg: number | null): string => (massKg === null ? '–' : formatDecimal(massKg / 1000, locale, 0))
  const change = ([first]: readonly (number | null)[], massKg: number | null): string =>
    first === null || first === undefined || first === 0 || massKg === null
      ? '–'
      : `${massKg >= first ? '+' : '−'}${formatShare(Math.abs(massKg / first - 1), locale)}`
  return (
    <Panel title={t('comparison.stock')} note={t('comparison.againstFirst')}>
      <DataTable
        label={t('comparison.stock')}
        rows={rows}
        rowKey={({ material }) => material}
        onSaveCsv={() =>
          downloadText(
            'comparison-stock.csv',
            csvText([
              ['material', ...loaded.map(({ run }) => `run_${run.number}_kg`)],
              ...rows.map(({ material, massesKg }) => [material, ...massesKg]),
            ]),
            'text/csv',
          )
        }
        columns={[
          {
            key: 'material',
            head: t('common.material'),
            cell: ({ material }) => <MaterialName material={material} />,
            weight: 2,
            minWidth: 150,
          },
          ...loaded.flatMap((one, place): Column<(typeof rows)[number]>[] => [
            {
              key: one.run.runId,
              head: t('comparison.tonnesOf', { run: nameOf(one) }),
              align: 'right',
              minWidth: 96,
              cell: ({ massesKg }) => tonnes(massesKg[place] ?? null),
              sortBy: ({ massesKg }) => massesKg[place] ?? 0,
            },
            ...(place === 0
              ? []
              : [
                  {
                    key: `${one.run.runId}-change`,
                    head: t('comparison.change'),
                    align: 'right' as const,
                    minWidth: 76,
                    cell: ({ massesKg }: (typeof rows)[number]) => change(massesKg, massesKg[place] ?? null),
                  },
                ]),
          ]),
        ]}
      />
    </Panel>
  )
}

function DecadesPanel({ loaded, nameOf }: PartProps) {
  const { t, locale } = useMessages()
  const rows = decadeRows(loaded.map(({ result }) => result))
  const mass = (massKg: number | null | undefined): string =>
    massKg === null || massKg === undefined ? '–' : formatDecimal(massKg / 1000, locale, 0)
  return (
    <Panel title={t('comparison.decades')} note={t('comparison.decadesNote')}>
      <DataTable
        label={t('comparison.decades')}
        rows={rows}
        rowKey={({ fromYear }) => String(fromYear)}
        onSaveCsv={() =>
          downloadText(
            'comparison-decades.csv',
            csvText([
              [
                'from_year',
                'to_year',
                ...loaded.flatMap(({ run }) => [
                  `run_${run.number}_demolition_kg`,
                  `run_${run.number}_refurbishment_kg`,
                ]),
              ],
              ...rows.map(({ fromYear, toYear, demolitionKg, refurbishmentKg }) => [
                fromYear,
                toYear,
                ...loaded.flatMap((_, place) => [demolitionKg[place] ?? null, refurbishmentKg[place] ?? null]),
              ]),
            ]),
            'text/csv',
          )
        }
        columns={[
          {
            key: 'years',
            head: t('loads.years'),
            cell: ({ fromYear, toYear }) => formatYearRange(fromYear, toYear),
            minWidth: 100,
          },
          ...loaded.flatMap((one, place): Column<(typeof rows)[number]>[] => [
            {
              key: `${one.run.runId}-d`,
              head: t('comparison.demolitionOf', { run: nameOf(one) }),
              align: 'right',
              minWidth: 110,
              cell: ({ demolitionKg }) => mass(demolitionKg[place]),
            },
            {
              key: `${one.run.runId}-r`,
              head: t('comparison.refurbishmentOf', { run: nameOf(one) }),
              align: 'right',
              minWidth: 110,
              cell: ({ refurbishmentKg }) => mass(refurbishmentKg[place]),
            },
          ]),
        ]}
      />
    </Panel>
  )
}
