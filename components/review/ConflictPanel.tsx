import { useMutation, useQueryClient } from '@tanstack/react-query'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { settleConflict, type ReviewSheet } from '@/shared/api/review'
import { useApi } from '@/sync/react/SessionProvider'
import { reviewKeys } from './reviewQueries'

interface ConflictPanelProps {
  readonly conflict: ReviewSheet['conflicts'][number]
}

/** Two surveyors, two values, one choice; nothing was overwritten silently. */
export function ConflictPanel({ conflict }: ConflictPanelProps) {
  const { t } = useMessages()
  const api = useApi()
  const queries = useQueryClient()
  const settle = useMutation({
    mutationFn: (choice: 'kept' | 'set-aside') =>
      api.call(settleConflict, { params: { conflictId: conflict.conflictId }, body: { choice } }),
    onSuccess: () => queries.invalidateQueries({ queryKey: reviewKeys.all }),
  })
  const isOpen = conflict.state === 'open'
  return (
    <Panel title={t('review.conflict', { group: conflict.group })} tone={isOpen ? 'attention' : 'ink'}>
      <AppText>{t('review.keptValue', { name: conflict.keptByName, value: JSON.stringify(conflict.kept) })}</AppText>
      <AppText>
        {t('review.setAsideValue', { name: conflict.setAsideByName, value: JSON.stringify(conflict.setAside) })}
      </AppText>
      {settle.error ? <ProblemNotice error={settle.error} isSending /> : null}
      {isOpen ? (
        <>
          <Button
            kind="secondary"
            label={t('review.keepIt', { name: conflict.keptByName })}
            onPress={() => settle.mutate('kept')}
            busy={settle.isPending}
          />
          <Button
            kind="secondary"
            label={t('review.keepIt', { name: conflict.setAsideByName })}
            onPress={() => settle.mutate('set-aside')}
            busy={settle.isPending}
          />
        </>
      ) : (
        <AppText soft>{t('review.settled')}</AppText>
      )}
    </Panel>
  )
}
