import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { Dialog } from '@/components/ui/Dialog'
import { useMessages } from '@/components/ui/MessagesProvider'
import { TextField } from '@/components/ui/TextField'
import { withdrawListing } from '@/shared/api/listings'
import type { Listing } from '@/shared/schemas/listing'
import { useApi } from '@/sync/react/SessionProvider'
import { listedKeys } from './listedQueries'

interface WithdrawListingDialogProps {
  readonly listing: Listing
  readonly onClose: () => void
}

/** Takes a listed building back, never without a reason. */
export function WithdrawListingDialog({ listing: { listingId, label }, onClose }: WithdrawListingDialogProps) {
  const { t } = useMessages()
  const api = useApi()
  const queries = useQueryClient()
  const [reason, setReason] = useState('')
  const [wasSent, setWasSent] = useState(false)
  const withdraw = useMutation({
    mutationFn: () => api.call(withdrawListing, { params: { listingId }, body: { reason: reason.trim() } }),
    onSuccess: async () => {
      await queries.invalidateQueries({ queryKey: listedKeys.all('desk') })
      onClose()
    },
  })
  return (
    <Dialog
      title={t('listed.takeBackTitle', { label })}
      tone="error"
      isOpen
      onClose={onClose}
      actions={
        <>
          <Button kind="quiet" label={t('common.cancel')} onPress={onClose} />
          <Button
            kind="danger"
            label={t('listed.takeBack')}
            busy={withdraw.isPending}
            onPress={() => {
              setWasSent(true)
              if (reason.trim() !== '') withdraw.mutate()
            }}
          />
        </>
      }
    >
      <AppText>{t('listed.takeBackLead')}</AppText>
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
