import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { Dialog } from '@/components/ui/Dialog'
import { useMessages } from '@/components/ui/MessagesProvider'
import { NumberField } from '@/components/ui/NumberField'
import { TextField } from '@/components/ui/TextField'
import { useToast } from '@/components/ui/Toast'
import { SPACE } from '@/components/ui/theme/tokens'
import { issueEdition } from '@/shared/api/factorBook'
import type { FullEdition } from '@/shared/schemas/factorBook'
import { useApi } from '@/sync/react/SessionProvider'
import { refusedFields } from './factorDraft'

interface IssueDialogProps {
  readonly edition: FullEdition
  readonly onClose: () => void
}

/** Asks for number and note, says how much of the draft is unsourced, and issues it. */
export function IssueDialog({ edition, onClose }: IssueDialogProps) {
  const { t } = useMessages()
  const api = useApi()
  const client = useQueryClient()
  const toast = useToast()
  const [number, setNumber] = useState<number | null>(edition.number)
  const [note, setNote] = useState('')
  const [wasSent, setWasSent] = useState(false)
  const isNumber = number !== null && Number.isInteger(number) && number > 0
  const issue = useMutation({
    mutationFn: (chosen: number) =>
      api.call(issueEdition, {
        params: { editionId: edition.editionId },
        body: { number: chosen, note: note.trim() },
      }),
    onSuccess: async (issued) => {
      await client.invalidateQueries({ queryKey: ['factor-book', 'editions'] })
      toast(t('factorBook.issueDone', { number: issued.number }), 'good')
      onClose()
    },
  })
  const send = (): void => {
    setWasSent(true)
    if (isNumber && note.trim() !== '') issue.mutate(number)
  }
  const weakCount = Object.values(edition.rows)
    .flat()
    .filter(({ provenance }) => provenance === 'from-memory' || provenance === 'common-practice').length
  const numberError = isNumber ? refusedFields(issue.error).get('number') : t('factorBook.issueNumberMissing')
  return (
    <Dialog
      title={t('factorBook.issueTitle', { name: edition.name })}
      isOpen
      onClose={onClose}
      actions={
        <>
          <Button kind="quiet" label={t('common.cancel')} onPress={onClose} />
          <Button kind="primary" label={t('factorBook.issueIt')} busy={issue.isPending} onPress={send} />
        </>
      }
    >
      <View style={styles.stack}>
        <AppText>{t('factorBook.issueLead')}</AppText>
        <AppText soft>{t('factorBook.weakCount', { count: weakCount })}</AppText>
        {issue.error ? <ProblemNotice error={issue.error} isSending /> : null}
        <NumberField
          label={t('factorBook.issueNumber')}
          value={number}
          onChange={setNumber}
          whole
          error={wasSent ? numberError : undefined}
        />
        <TextField
          label={t('factorBook.issueNote')}
          value={note}
          onChange={setNote}
          multiline
          maxLength={2_000}
          error={wasSent && note.trim() === '' ? t('factorBook.issueNoteMissing') : undefined}
        />
      </View>
    </Dialog>
  )
}

const styles = StyleSheet.create({ stack: { gap: SPACE.medium } })
