import { useQueries } from '@tanstack/react-query'
import { useLocalSearchParams, useRouter } from 'expo-router'
import { View } from 'react-native'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { runQuery } from '@/components/runs/runQueries'
import { useChosenRun } from '@/components/runs/useChosenRun'
import { AppText } from '@/components/ui/AppText'
import { CheckBox } from '@/components/ui/CheckBox'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Screen } from '@/components/ui/Screen'
import type { RunResult, RunSummary } from '@/shared/schemas/run'
import { useApi } from '@/sync/react/SessionProvider'
import { ComparisonReport } from './ComparisonReport'

/** As many as the chart has lines for. */
const MOST_RUNS = 4

/** A run with its result, loaded. */
export interface LoadedRun {
  readonly run: RunSummary
  readonly result: RunResult
}

/** Two to four finished runs side by side; which ones stands in the address. */
export function CompareScreen() {
  const { t } = useMessages()
  const api = useApi()
  const router = useRouter()
  const { runs: wanted } = useLocalSearchParams<{ runs?: string }>()
  const { finished, isLoading, error, retry } = useChosenRun()
  const asked = wanted === undefined ? finished.slice(0, 2).map(({ runId }) => runId) : wanted.split(',')
  const chosen = finished.filter(({ runId }) => asked.includes(runId)).slice(0, MOST_RUNS)
  const pages = useQueries({ queries: chosen.map(({ runId }) => runQuery(api, runId)) })
  const loaded = pages.flatMap(({ data }): LoadedRun[] => (data?.result ? [{ run: data, result: data.result }] : []))
  const fault = error ?? pages.find((page) => page.error)?.error
  const toggle = (runId: string, isChosen: boolean): void => {
    const next = isChosen
      ? [...chosen.map((run) => run.runId), runId]
      : chosen.map((run) => run.runId).filter((one) => one !== runId)
    router.setParams({ runs: next.join(',') })
  }
  return (
    <Screen title={t('nav.compare')} subtitle={t('comparison.subtitle')} width="full">
      {fault ? <ProblemNotice error={fault} onRetry={retry} /> : null}
      {isLoading ? <AppText soft>{t('common.loading')}</AppText> : null}
      {!isLoading && finished.length < 2 ? (
        <EmptyState title={t('comparison.tooFew')} text={t('comparison.tooFewText')} />
      ) : (
        <Panel title={t('comparison.choose')} note={t('comparison.chooseNote', { most: MOST_RUNS })}>
          <View role="group" aria-label={t('comparison.choose')}>
            {finished.map(({ runId, number, roundName, scenario }) => (
              <CheckBox
                key={runId}
                label={t('runs.option', { number, round: roundName, scenario: scenario.name })}
                checked={chosen.some((run) => run.runId === runId)}
                disabled={chosen.length >= MOST_RUNS && !chosen.some((run) => run.runId === runId)}
                onChange={(isChosen) => toggle(runId, isChosen)}
              />
            ))}
          </View>
        </Panel>
      )}
      {loaded.length >= 2 ? <ComparisonReport loaded={loaded} /> : null}
      {loaded.length < 2 && finished.length >= 2 && chosen.length < 2 ? (
        <AppText>{t('comparison.chooseTwo')}</AppText>
      ) : null}
    </Screen>
  )
}
