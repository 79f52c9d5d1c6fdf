import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { View } from 'react-native'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { DataTable } from '@/components/ui/DataTable'
import { Dialog } from '@/components/ui/Dialog'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { removeBeat, type Beat, type RoundWithBeats } from '@/shared/api/rounds'
import { formatCount } from '@/shared/format'
import { useApi } from '@/sync/react/SessionProvider'
import { roundKeys } from './roundQueries'

interface BeatTableProps {
  readonly round: RoundWithBeats
  readonly onEdit: (beat: Beat) => void
}

/** Beats with their surveyors and coverage; press one to change it. */
export function BeatTable({ round, onEdit }: BeatTableProps) {
  const { t, locale } = useMessages()
  const [dissolved, setDissolved] = useState<Beat | null>(null)
  const count = (value: number) => formatCount(value, locale)
  if (round.beats.length === 0) return <EmptyState title={t('rounds.noBeat')} text={t('rounds.noBeatText')} />
  return (
    <View>
      <DataTable
        label={t('rounds.beats')}
        rows={round.beats}
        rowKey={(beat) => beat.beatId}
        onPressRow={onEdit}
        rowLabel={(beat) => t('rounds.changeBeat', { name: beat.name })}
        columns={[
          { key: 'name', head: t('rounds.beat'), cell: (beat) => beat.name },
          { key: 'surveyor', head: t('rounds.surveyor'), cell: (beat) => beat.surveyorName ?? t('rounds.nobodyYet') },
          {
            key: 'all',
            head: t('rounds.buildings'),
            align: 'right',
            cell: (beat) => count(beat.coverage.buildingCount),
          },
          { key: 'todo', head: t('rounds.toDo'), align: 'right', cell: (beat) => count(beat.coverage.toDoCount) },
          {
            key: 'waiting',
            head: t('rounds.handedIn'),
            align: 'right',
            cell: (beat) => count(beat.coverage.handedInCount),
          },
          {
            key: 'checked',
            head: t('rounds.checked'),
            align: 'right',
            cell: (beat) => count(beat.coverage.checkedCount),
          },
          {
            key: 'dissolve',
            head: t('common.act'),
            cell: (beat) => (
              <Button
                kind="quiet"
                label={t('rounds.dissolve')}
                accessibleLabel={t('rounds.dissolveBeat', { name: beat.name })}
                onPress={() => setDissolved(beat)}
              />
            ),
          },
        ]}
      />
      {dissolved ? <DissolveDialog round={round} beat={dissolved} onClose={() => setDissolved(null)} /> : null}
    </View>
  )
}

function DissolveDialog({
  round,
  beat,
  onClose,
}: {
  readonly round: RoundWithBeats
  readonly beat: Beat
  readonly onClose: () => void
}) {
  const { t } = useMessages()
  const api = useApi()
  const queries = useQueryClient()
  const dissolve = useMutation({
    mutationFn: () => api.call(removeBeat, { params: { roundId: round.roundId, beatId: beat.beatId } }),
    onSuccess: (changed) => {
      queries.setQueryData(roundKeys.one(round.roundId), changed)
      onClose()
    },
  })
  return (
    <Dialog
      title={t('rounds.dissolveBeat', { name: beat.name })}
      isOpen
      onClose={onClose}
      tone="attention"
      actions={
        <Button
          kind="danger"
          label={t('rounds.dissolve')}
          onPress={() => dissolve.mutate()}
          busy={dissolve.isPending}
        />
      }
    >
      <AppText>{t('rounds.dissolveText')}</AppText>
      {dissolve.error ? <ProblemNotice error={dissolve.error} isSending /> : null}
    </Dialog>
  )
}
