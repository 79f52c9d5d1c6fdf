import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { useEffect, useState } from 'react'
import { Button } from '@/components/ui/Button'
import { Dialog } from '@/components/ui/Dialog'
import { useMessages } from '@/components/ui/MessagesProvider'
import { useToast } from '@/components/ui/Toast'
import { cancelRun, startRun } from '@/shared/api/runs'
import { useApi } from '@/sync/react/SessionProvider'
import { NewRunForm } from './NewRunForm'
import { NewRunProgress } from './NewRunProgress'
import { ProblemNotice } from './ProblemNotice'
import { runEditionsQuery, runRoundsQuery } from './runQueries'
import { draftFaults, startBody, type RunDraft } from './runDraft'

interface NewRunDialogProps {
  readonly onClose: () => void
  /** Called once the run is done, with its id. */
  readonly onDone: (runId: string) => void
}

/** Asks what to compute, starts it, and stays until it is done or has failed. */
export function NewRunDialog({ onClose, onDone }: NewRunDialogProps) {
  const { t } = useMessages()
  const api = useApi()
  const client = useQueryClient()
  const toast = useToast()
  const rounds = useQuery(runRoundsQuery(api))
  const editions = useQuery(runEditionsQuery(api))
  const [draft, setDraft] = useState<RunDraft>({
    roundId: null,
    editionId: null,
    name: t('runs.scenarioNameDefault'),
    horizonYears: 100,
    seed: 1,
    appliesHazardMultipliers: true,
  })
  const [wasSent, setWasSent] = useState(false)
  useEffect(() => {
    const roundId = rounds.data?.[0]?.roundId ?? null
    const editionId = editions.data?.find(({ state }) => state === 'issued')?.editionId ?? null
    setDraft((known) => ({ ...known, roundId: known.roundId ?? roundId, editionId: known.editionId ?? editionId }))
  }, [rounds.data, editions.data])

  const start = useMutation({
    mutationFn: (body: ReturnType<typeof startBody>) => api.call(startRun, { body }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['runs'], exact: true }),
  })
  const stop = useMutation({
    mutationFn: (runId: string) => api.call(cancelRun, { params: { runId } }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['runs'] }),
  })
  const faults = draftFaults(draft)
  const send = (): void => {
    setWasSent(true)
    if (Object.keys(faults).length === 0) start.mutate(startBody(draft))
  }
  const finish = async (runId: string, number: number): Promise<void> => {
    await client.invalidateQueries({ queryKey: ['runs'], exact: true })
    toast(t('runs.doneToast', { number }), 'good')
    onDone(runId)
    onClose()
  }
  const error = rounds.error ?? editions.error
  const started = start.data
  return (
    <Dialog
      title={t('runs.newRunTitle')}
      isOpen
      onClose={onClose}
      actions={
        started ? (
          <>
            <Button
              kind="quiet"
              label={t('runs.stop')}
              busy={stop.isPending}
              onPress={() => stop.mutate(started.runId)}
            />
            <Button kind="secondary" label={t('common.close')} onPress={onClose} />
          </>
        ) : (
          <>
            <Button kind="quiet" label={t('common.cancel')} onPress={onClose} />
            <Button kind="primary" label={t('runs.start')} busy={start.isPending} onPress={send} />
          </>
        )
      }
    >
      {error ? <ProblemNotice error={error} /> : null}
      {start.error ? <ProblemNotice error={start.error} isSending /> : null}
      {stop.error ? <ProblemNotice error={stop.error} isSending /> : null}
      {started ? (
        <NewRunProgress runId={started.runId} onDone={finish} />
      ) : (
        <NewRunForm
          draft={draft}
          onChange={setDraft}
          rounds={rounds.data ?? []}
          editions={editions.data ?? []}
          faults={wasSent ? faults : {}}
        />
      )}
    </Dialog>
  )
}
