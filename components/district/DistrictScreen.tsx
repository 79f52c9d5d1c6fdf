import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { NewRunButton, RunPicker } from '@/components/runs/RunPicker'
import { useChosenRun } from '@/components/runs/useChosenRun'
import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Screen } from '@/components/ui/Screen'
import { PlainDistrict } from './PlainDistrict'
import { RunDistrict } from './RunDistrict'

/** The district on a map: by the figures of the chosen run, or bare while there is none. */
export function DistrictScreen() {
  const { t } = useMessages()
  const chosen = useChosenRun()
  if (chosen.run) {
    const { run, finished, choose } = chosen
    return (
      <RunDistrict key={run.runId} run={run} picker={<RunPicker finished={finished} run={run} onChoose={choose} />} />
    )
  }
  if (chosen.error || chosen.isLoading) {
    return (
      <Screen title={t('district.title')}>
        {chosen.error ? <ProblemNotice error={chosen.error} onRetry={chosen.retry} /> : null}
        {chosen.isLoading ? <AppText soft>{t('common.loading')}</AppText> : null}
      </Screen>
    )
  }
  return <PlainDistrict action={<NewRunButton onDone={chosen.choose} />} />
}
