import { useMutation } from '@tanstack/react-query'
import { useState } from 'react'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { Button } from '@/components/ui/Button'
import { Dialog } from '@/components/ui/Dialog'
import { useMessages } from '@/components/ui/MessagesProvider'
import { TextField } from '@/components/ui/TextField'
import { sendBackSheet, type ReviewSheet } from '@/shared/api/review'
import { useApi } from '@/sync/react/SessionProvider'

interface SendBackDialogProps {
  readonly sheet: ReviewSheet
  readonly onClose: () => void
  readonly onSent: () => void
}

/** The question that goes back with a sheet; the surveyor sees it on Today. */
export function SendBackDialog({ sheet, onClose, onSent }: SendBackDialogProps) {
  const { t } = useMessages()
  const api = useApi()
  const [question, setQuestion] = useState('')
  const send = useMutation({
    mutationFn: () =>
      api.call(sendBackSheet, { params: { sheetId: sheet.sheetId }, body: { question, change: sheet.change } }),
    onSuccess: () => {
      onClose()
      onSent()
    },
  })
  return (
    <Dialog
      title={t('review.sendBack')}
      isOpen
      onClose={onClose}
      actions={
        <Button
          kind="primary"
          label={t('review.sendBack')}
          onPress={() => send.mutate()}
          busy={send.isPending}
          disabled={question.trim() === ''}
        />
      }
    >
      <TextField
        label={t('review.question')}
        hint={t('review.questionHint')}
        value={question}
        onChange={setQuestion}
        multiline
        lines={3}
        autoFocus
        maxLength={500}
      />
      {send.error ? <ProblemNotice error={send.error} isSending /> : null}
    </Dialog>
  )
}
