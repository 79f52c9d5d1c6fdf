import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { Dialog } from '@/components/ui/Dialog'
import { useMessages } from '@/components/ui/MessagesProvider'
import { TextField } from '@/components/ui/TextField'
import { useToast } from '@/components/ui/Toast'
import { withdrawPublication, type Publication } from '@/shared/api/publications'
import { useApi } from '@/sync/react/SessionProvider'

interface WithdrawDialogProps {
  readonly publication: Publication
  readonly onClose: () => void
}

/** Takes a publication back, never without a reason. */
export function WithdrawDialog({ publication, onClose }: WithdrawDialogProps) {
  const { t } = useMessages()
  const api = useApi()
  const client = useQueryClient()
  const toast = useToast()
  const [reason, setReason] = useState('')
  const [wasSent, setWasSent] = useState(false)
  const { publicationId, title } = publication
  const withdraw = useMutation({
    mutationFn: () => api.call(withdrawPublication, { params: { publicationId }, body: { reason: reason.trim() } }),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: ['publications'] })
      toast(t('publish.withdrawnToast', { title }), 'good')
      onClose()
    },
  })
  const send = (): void => {
    setWasSent(true)
    if (reason.trim() !== '') withdraw.mutate()
  }
  return (
    <Dialog
      title={t('publish.withdrawTitle')}
      tone="error"
      isOpen
      onClose={onClose}
      actions={
        <>
          <Button kind="quiet" label={t('common.cancel')} onPress={onClose} />
          <Button kind="danger" label={t('publish.withdraw')} busy={withdraw.isPending} onPress={send} />
        </>
      }
    >
      <AppText weight="semibold">{title}</AppText>
      <AppText>{t('publish.withdrawLead')}</AppText>
      {withdraw.error ? <ProblemNotice error={withdraw.error} isSending /> : null}
      <TextField
        label={t('publish.reason')}
        hint={t('publish.reasonHint')}
        value={reason}
        onChange={setReason}
        maxLength={500}
        multiline
        required
        error={wasSent && reason.trim() === '' ? t('publish.reasonMissing') : undefined}
      />
    </Dialog>
  )
}
