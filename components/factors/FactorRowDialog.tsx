import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { Button } from '@/components/ui/Button'
import { Dialog } from '@/components/ui/Dialog'
import { useMessages } from '@/components/ui/MessagesProvider'
import { useToast } from '@/components/ui/Toast'
import { SPACE } from '@/components/ui/theme/tokens'
import { addFactorRow, changeFactorRow, removeFactorRow } from '@/shared/api/factorBook'
import { FACTOR_COLUMNS, type FactorPart } from '@/shared/factorBook/factorColumns'
import { judgeFactorRow } from '@/shared/factorBook/judgeFactorRow'
import { useApi } from '@/sync/react/SessionProvider'
import { draftErrors, factorDraft, refusedFields } from './factorDraft'
import { FactorField } from './FactorField'

interface FactorRowDialogProps {
  readonly editionId: string
  readonly part: FactorPart
  /** Left out for a new row. */
  readonly row?: { readonly rowId: string }
  readonly onClose: () => void
}

/** All cells of one row of a draft; nothing is saved before every cell holds. */
export function FactorRowDialog({ editionId, part, row, onClose }: FactorRowDialogProps) {
  const { t } = useMessages()
  const api = useApi()
  const client = useQueryClient()
  const toast = useToast()
  const columns = FACTOR_COLUMNS[part]
  const [draft, setDraft] = useState(() => factorDraft(columns, row))
  const [wasSent, setWasSent] = useState(false)
  const finish = async (message: string): Promise<void> => {
    await client.invalidateQueries({ queryKey: ['factor-book', 'editions', editionId] })
    toast(message, 'good')
    onClose()
  }
  const save = useMutation({
    mutationFn: () =>
      row
        ? api.call(changeFactorRow, { params: { editionId, part, rowId: row.rowId }, body: draft })
        : api.call(addFactorRow, { params: { editionId, part }, body: draft }),
    onSuccess: () => finish(t('factorBook.rowSaved')),
  })
  const remove = useMutation({
    mutationFn: (rowId: string) => api.call(removeFactorRow, { params: { editionId, rowId } }),
    onSuccess: () => finish(t('factorBook.rowRemoved')),
  })
  const faults = judgeFactorRow(part, draft)
  const errors = faults.length > 0 ? draftErrors(faults, t) : refusedFields(save.error)
  const send = (): void => {
    setWasSent(true)
    if (faults.length === 0) save.mutate()
  }
  const error = save.error ?? remove.error
  const name = t(`factorBook.${part}`)
  return (
    <Dialog
      title={t(row ? 'factorBook.changeRowTitle' : 'factorBook.addRowTitle', { part: name })}
      isOpen
      onClose={onClose}
      maxWidth={760}
      actions={
        <>
          {row ? (
            <Button
              kind="danger"
              label={t('factorBook.removeRow')}
              busy={remove.isPending}
              onPress={() => remove.mutate(row.rowId)}
            />
          ) : null}
          <Button kind="quiet" label={t('common.cancel')} onPress={onClose} />
          <Button kind="primary" label={t('common.save')} busy={save.isPending} onPress={send} />
        </>
      }
    >
      {error ? <ProblemNotice error={error} isSending /> : null}
      <View style={styles.fields}>
        {columns.map((column) => (
          <View key={column.field} style={(column.longest ?? 0) > 300 ? styles.wide : styles.field}>
            <FactorField
              column={column}
              value={draft[column.field] ?? null}
              error={wasSent ? errors.get(column.field) : undefined}
              onChange={(value) => {
                setDraft((known) => ({ ...known, [column.field]: value }))
                save.reset()
              }}
            />
          </View>
        ))}
      </View>
    </Dialog>
  )
}

const styles = StyleSheet.create({
  fields: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.medium },
  field: { flexGrow: 1, flexBasis: 210 },
  wide: { flexGrow: 1, flexBasis: '100%' },
})
