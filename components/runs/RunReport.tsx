import { useQuery } from '@tanstack/react-query'
import type { ReactNode } from 'react'
import { AppText } from '@/components/ui/AppText'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Screen } from '@/components/ui/Screen'
import type { RunResult, RunSummary } from '@/shared/schemas/run'
import { useApi } from '@/sync/react/SessionProvider'
import { ProblemNotice } from './ProblemNotice'
import { RunBasisPanel } from './RunBasisPanel'
import { NewRunButton, RunPicker } from './RunPicker'
import { runQuery } from './runQueries'
import { RunTitleBlock } from './RunTitleBlock'
import { useChosenRun } from './useChosenRun'

interface RunReportProps {
  readonly title: string
  readonly children: (run: RunSummary, result: RunResult) => ReactNode
}

/** A screen of figures of one run: which run, the figures, what they rest on, and the title block. */
export function RunReport({ title, children }: RunReportProps) {
  const { t } = useMessages()
  const chosen = useChosenRun()
  if (chosen.error) {
    return (
      <Screen title={title}>
        <ProblemNotice error={chosen.error} onRetry={chosen.retry} />
      </Screen>
    )
  }
  if (!chosen.run) {
    return (
      <Screen title={title}>
        {chosen.isLoading ? (
          <AppText soft>{t('common.loading')}</AppText>
        ) : (
          <EmptyState
            title={t('runs.none')}
            text={t('runs.noneText')}
            action={<NewRunButton onDone={chosen.choose} />}
          />
        )}
      </Screen>
    )
  }
  return (
    <LoadedReport title={title} run={chosen.run} picker={<RunPicker {...chosen} onChoose={chosen.choose} />}>
      {children}
    </LoadedReport>
  )
}

interface LoadedReportProps extends RunReportProps {
  readonly run: RunSummary
  readonly picker: ReactNode
}

function LoadedReport({ title, run, picker, children }: LoadedReportProps) {
  const { t } = useMessages()
  const read = useQuery(runQuery(useApi(), run.runId))
  const result = read.data?.result ?? null
  return (
    <Screen
      title={title}
      subtitle={`${run.districtName} · ${run.roundName}`}
      width="full"
      aside={result ? <RunBasisPanel run={run} result={result} /> : undefined}
    >
      {picker}
      {read.error ? <ProblemNotice error={read.error} onRetry={() => void read.refetch()} /> : null}
      {result ? (
        <>
          {children(run, result)}
          <RunTitleBlock run={run} />
        </>
      ) : read.error ? null : (
        <AppText soft>{t('runs.loading')}</AppText>
      )}
    </Screen>
  )
}
