import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { CheckBox } from '@/components/ui/CheckBox'
import { Dialog } from '@/components/ui/Dialog'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Select } from '@/components/ui/Select'
import { TextField } from '@/components/ui/TextField'
import { useToast } from '@/components/ui/Toast'
import { SPACE } from '@/components/ui/theme/tokens'
import { publishRun } from '@/shared/api/publications'
import type { Person } from '@/shared/schemas/person'
import type { RunSummary } from '@/shared/schemas/run'
import { useApi } from '@/sync/react/SessionProvider'
import { contractorsQuery } from './publicationQueries'

interface PublishDialogProps {
  readonly finished: readonly RunSummary[]
  readonly onClose: () => void
}

/** Asks which run goes to whom, and publishes it. */
export function PublishDialog({ finished, onClose }: PublishDialogProps) {
  const { t } = useMessages()
  const api = useApi()
  const client = useQueryClient()
  const toast = useToast()
  const contractors = useQuery(contractorsQuery(api))
  const [runId, setRunId] = useState(finished[0]?.runId ?? null)
  const run = finished.find((candidate) => candidate.runId === runId)
  const [typedTitle, setTitle] = useState<string | null>(null)
  const [recipientIds, setRecipients] = useState<readonly string[]>([])
  const [wasSent, setWasSent] = useState(false)
  const title =
    typedTitle ?? (run ? t('publish.titleDefault', { district: run.districtName, year: run.surveyYear }) : '')
  const publish = useMutation({
    mutationFn: (chosenRunId: string) =>
      api.call(publishRun, { body: { runId: chosenRunId, title: title.trim(), recipientIds: [...recipientIds] } }),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: ['publications'] })
      toast(t('publish.sent', { title: title.trim() }), 'good')
      onClose()
    },
  })
  const send = (): void => {
    setWasSent(true)
    if (run && title.trim() !== '' && recipientIds.length > 0) publish.mutate(run.runId)
  }
  return (
    <Dialog
      title={t('publish.dialogTitle')}
      isOpen
      onClose={onClose}
      actions={
        <>
          <Button kind="quiet" label={t('common.cancel')} onPress={onClose} />
          <Button kind="primary" label={t('publish.send')} busy={publish.isPending} onPress={send} />
        </>
      }
    >
      <View style={styles.stack}>
        <AppText>{t('publish.lead')}</AppText>
        {publish.error ? <ProblemNotice error={publish.error} isSending /> : null}
        <Select
          label={t('publish.runField')}
          options={finished.map((option) => ({
            value: option.runId,
            label: t('runs.option', {
              number: option.number,
              round: option.roundName,
              scenario: option.scenario.name,
            }),
          }))}
          value={runId}
          onChange={setRunId}
          error={wasSent && !run ? t('publish.runMissing') : undefined}
        />
        <TextField
          label={t('publish.titleField')}
          hint={t('publish.titleHint')}
          value={title}
          onChange={setTitle}
          maxLength={160}
          error={wasSent && title.trim() === '' ? t('publish.titleMissing') : undefined}
        />
        {contractors.error ? (
          <ProblemNotice error={contractors.error} onRetry={() => void contractors.refetch()} />
        ) : (
          <Contractors people={contractors.data} chosen={recipientIds} onChange={setRecipients} />
        )}
        {wasSent && recipientIds.length === 0 ? <Notice urgent whatHappened={t('publish.contractorsMissing')} /> : null}
      </View>
    </Dialog>
  )
}

interface ContractorsProps {
  readonly people: readonly Person[] | undefined
  readonly chosen: readonly string[]
  readonly onChange: (personIds: readonly string[]) => void
}

function Contractors({ people, chosen, onChange }: ContractorsProps) {
  const { t } = useMessages()
  if (!people) return <AppText soft>{t('common.loading')}</AppText>
  const open = people.filter(({ status }) => status !== 'disabled')
  if (open.length === 0) return <Notice tone="attention" whatHappened={t('publish.noContractors')} />
  return (
    <View role="group" aria-label={t('publish.contractors')}>
      <AppText kind="label">{t('publish.contractors')}</AppText>
      {open.map(({ personId, name, firm }) => (
        <CheckBox
          key={personId}
          label={firm === null ? name : t('publish.contractorOption', { name, firm })}
          checked={chosen.includes(personId)}
          onChange={(isChosen) =>
            onChange(isChosen ? [...chosen, personId] : chosen.filter((other) => other !== personId))
          }
        />
      ))}
    </View>
  )
}

const styles = StyleSheet.create({ stack: { gap: SPACE.medium } })
