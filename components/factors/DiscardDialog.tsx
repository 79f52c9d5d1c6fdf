import { useMutation, useQueryClient } from '@tanstack/react-query'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { Dialog } from '@/components/ui/Dialog'
import { useMessages } from '@/components/ui/MessagesProvider'
import { useToast } from '@/components/ui/Toast'
import { discardEdition } from '@/shared/api/factorBook'
import type { Edition } from '@/shared/schemas/factorBook'
import { useApi } from '@/sync/react/SessionProvider'

interface DiscardDialogProps {
  readonly edition: Edition
  readonly onClose: () => void
}

/** Asks once more before a draft is deleted. */
export function DiscardDialog({ edition, onClose }: DiscardDialogProps) {
  const { t } = useMessages()
  const api = useApi()
  const client = useQueryClient()
  const toast = useToast()
  const discard = useMutation({
    mutationFn: () => api.call(discardEdition, { params: { editionId: edition.editionId } }),
    onSuccess: async () => {
      onClose()
      toast(t('factorBook.discardDone', { name: edition.name }), 'good')
      await client.invalidateQueries({ queryKey: ['factor-book', 'editions'], exact: true })
    },
  })
  return (
    <Dialog
      title={t('factorBook.discardTitle', { name: edition.name })}
      isOpen
      onClose={onClose}
      tone="error"
      actions={
        <>
          <Button kind="quiet" label={t('common.cancel')} onPress={onClose} />
          <Button
            kind="danger"
            label={t('factorBook.discardIt')}
            busy={discard.isPending}
            onPress={() => discard.mutate()}
          />
        </>
      }
    >
      {discard.error ? <ProblemNotice error={discard.error} isSending /> : null}
      <AppText>{t('factorBook.discardLead')}</AppText>
    </Dialog>
  )
}
