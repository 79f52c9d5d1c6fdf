import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { Dialog } from '@/components/ui/Dialog'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Select } from '@/components/ui/Select'
import { TextField } from '@/components/ui/TextField'
import { useToast } from '@/components/ui/Toast'
import { SPACE } from '@/components/ui/theme/tokens'
import { draftEdition } from '@/shared/api/factorBook'
import type { Edition } from '@/shared/schemas/factorBook'
import { useApi } from '@/sync/react/SessionProvider'

interface NewDraftDialogProps {
  readonly editions: readonly Edition[]
  /** The edition on the screen: what a draft is most likely made from. */
  readonly fromId: string | null
  readonly onClose: () => void
  readonly onMade: (editionId: string) => void
}

/** Asks what a draft is called and what it is a copy of. */
export function NewDraftDialog({ editions, fromId, onClose, onMade }: NewDraftDialogProps) {
  const { t } = useMessages()
  const api = useApi()
  const client = useQueryClient()
  const toast = useToast()
  const [name, setName] = useState('')
  const [from, setFrom] = useState(fromId ?? 'published')
  const [wasSent, setWasSent] = useState(false)
  const make = useMutation({
    mutationFn: () => api.call(draftEdition, { body: { name: name.trim(), from } }),
    onSuccess: async (made) => {
      await client.invalidateQueries({ queryKey: ['factor-book', 'editions'] })
      toast(t('factorBook.draftMade', { name: made.name }), 'good')
      onMade(made.editionId)
      onClose()
    },
  })
  const send = (): void => {
    setWasSent(true)
    if (name.trim() !== '') make.mutate()
  }
  return (
    <Dialog
      title={t('factorBook.newDraftTitle')}
      isOpen
      onClose={onClose}
      actions={
        <>
          <Button kind="quiet" label={t('common.cancel')} onPress={onClose} />
          <Button kind="primary" label={t('factorBook.makeDraft')} busy={make.isPending} onPress={send} />
        </>
      }
    >
      <View style={styles.stack}>
        <AppText>{t('factorBook.newDraftLead')}</AppText>
        {make.error ? <ProblemNotice error={make.error} isSending /> : null}
        <TextField
          label={t('factorBook.draftName')}
          value={name}
          onChange={setName}
          maxLength={120}
          error={wasSent && name.trim() === '' ? t('factorBook.draftNameMissing') : undefined}
        />
        <Select<string>
          label={t('factorBook.draftFrom')}
          value={from}
          onChange={setFrom}
          options={[
            ...editions.map((edition) => ({
              value: edition.editionId,
              label: t('factorBook.editionOption', { number: edition.number, name: edition.name }),
            })),
            { value: 'published', label: t('factorBook.fromPublished') },
          ]}
        />
      </View>
    </Dialog>
  )
}

const styles = StyleSheet.create({ stack: { gap: SPACE.medium } })
