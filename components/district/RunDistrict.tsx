import { useQuery } from '@tanstack/react-query'
import { useMemo, useState, type ReactNode } from 'react'
import { ScrollView, StyleSheet, View } from 'react-native'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { runBuildingsQuery, runQuery } from '@/components/runs/runQueries'
import { RunBasisPanel } from '@/components/runs/RunBasisPanel'
import { RunTitleBlock } from '@/components/runs/RunTitleBlock'
import { AppText } from '@/components/ui/AppText'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Screen } from '@/components/ui/Screen'
import { SPACE } from '@/components/ui/theme/tokens'
import { formatCount, formatMass } from '@/shared/format'
import type { RunBuilding, RunResult, RunSummary } from '@/shared/schemas/run'
import { useApi } from '@/sync/react/SessionProvider'
import { BuildingReceipt } from './BuildingReceipt'
import { BuildingTable } from './BuildingTable'
import { DistrictControls, type DistrictView } from './DistrictControls'
import { DistrictMap } from './DistrictMap'
import { districtOutlinesQuery } from './districtQueries'
import { outlineName } from './outlineName'
import { useMapRoom } from './useMapRoom'

interface RunDistrictProps {
  readonly run: RunSummary
  readonly picker: ReactNode
}

/** A district by the figures of a run: the map or the table, and the receipt of the building that was pressed. */
export function RunDistrict({ run, picker }: RunDistrictProps) {
  const { t } = useMessages()
  const api = useApi()
  const { fills, heightPx } = useMapRoom()
  const outlines = useQuery(districtOutlinesQuery(api, run.districtId))
  const buildings = useQuery(runBuildingsQuery(api, run.runId))
  const read = useQuery(runQuery(api, run.runId))
  const [view, setView] = useState<DistrictView>({ measure: 'perFootprint', material: 'all', shape: 'map' })
  const [selectedOutlineId, setSelected] = useState<string | null>(null)
  const shapes = useMemo(
    () =>
      (outlines.data ?? []).map(({ geometry, properties }) => ({
        id: properties.outlineId,
        geometry,
        name: outlineName(properties),
      })),
    [outlines.data],
  )
  const found = buildings.data ?? []
  const selected = found.find(({ outlineId }) => outlineId !== null && outlineId === selectedOutlineId)
  const error = outlines.error ?? buildings.error ?? read.error
  const retry = (): void => {
    for (const query of [outlines, buildings, read]) if (query.error) void query.refetch()
  }
  const result = read.data?.result ?? null
  return (
    <Screen
      title={t('district.title')}
      subtitle={`${run.districtName} · ${run.roundName}`}
      width="full"
      fill={fills}
      aside={
        <>
          <Receipt
            runId={run.runId}
            building={selected}
            isPressed={selectedOutlineId !== null}
            onClose={() => setSelected(null)}
          />
          {result ? <Totals run={run} result={result} buildings={found} /> : null}
          {result ? <RunBasisPanel run={run} result={result} /> : null}
          <RunTitleBlock run={run} />
        </>
      }
    >
      <View style={fills ? styles.bar : styles.plainBar}>
        {picker}
        <DistrictControls view={view} onChange={setView} />
        {error ? <ProblemNotice error={error} onRetry={retry} /> : null}
        {outlines.isPending || buildings.isPending ? <AppText soft>{t('common.loading')}</AppText> : null}
      </View>
      {view.shape === 'map' ? (
        <DistrictMap
          districtName={run.districtName}
          outlines={shapes}
          buildings={found}
          measure={view.measure}
          material={view.material}
          selectedOutlineId={selectedOutlineId}
          onPress={setSelected}
          heightPx={heightPx}
        />
      ) : (
        <TableRoom fills={fills}>
          <BuildingTable
            buildings={found}
            material={view.material}
            selectedId={selected?.buildingId ?? null}
            onSelect={({ outlineId }) => setSelected(outlineId)}
            fileName={`run-${run.number}-buildings.csv`}
          />
        </TableRoom>
      )}
    </Screen>
  )
}

/** The table scrolls by itself beside the panels, and with the page above them. */
function TableRoom({ fills, children }: { readonly fills: boolean; readonly children: ReactNode }) {
  if (!fills) return children
  return (
    <ScrollView style={styles.list} contentContainerStyle={styles.listBody}>
      {children}
    </ScrollView>
  )
}

interface ReceiptProps {
  readonly runId: string
  readonly building: RunBuilding | undefined
  readonly isPressed: boolean
  readonly onClose: () => void
}

function Receipt({ runId, building, isPressed, onClose }: ReceiptProps) {
  const { t } = useMessages()
  if (building) return <BuildingReceipt runId={runId} building={building} onClose={onClose} />
  if (isPressed) return <EmptyState title={t('district.notInRun')} text={t('district.notInRunText')} />
  return <AppText soft>{t('district.select')}</AppText>
}

interface TotalsProps {
  readonly run: RunSummary
  readonly result: RunResult
  readonly buildings: readonly RunBuilding[]
}

function Totals({ run, result, buildings }: TotalsProps) {
  const { t, locale } = useMessages()
  const expectedKg = buildings.reduce((sum, { massKg, chanceTenYears }) => sum + massKg * chanceTenYears, 0)
  return (
    <Panel title={t('district.totals')} note={run.districtName}>
      <AppText kind="figure" size="figure">
        {t('district.totalStanding', { mass: formatMass(result.stock.total.meanKg, locale) })}
      </AppText>
      <AppText>{t('district.totalExpected', { mass: formatMass(expectedKg, locale) })}</AppText>
      <AppText soft>
        {t('district.totalBuildings', {
          computed: formatCount(result.basis.computedCount, locale),
          frame: formatCount(result.basis.frameCount, locale),
        })}
      </AppText>
    </Panel>
  )
}

const styles = StyleSheet.create({
  bar: { padding: SPACE.medium, gap: SPACE.medium },
  plainBar: { gap: SPACE.medium },
  list: { flex: 1 },
  listBody: { padding: SPACE.medium },
})
