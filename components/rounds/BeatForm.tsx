import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Select } from '@/components/ui/Select'
import { TextField } from '@/components/ui/TextField'
import { SPACE } from '@/components/ui/theme/tokens'
import { useToast } from '@/components/ui/Toast'
import { changeBeat, createBeat, type Beat, type RoundWithBeats } from '@/shared/api/rounds'
import { useApi } from '@/sync/react/SessionProvider'
import { roundKeys, surveyorsQuery } from './roundQueries'

interface BeatFormProps {
  readonly round: RoundWithBeats
  readonly edited: Beat | null
  readonly selectedIds: readonly string[]
  readonly onSelectFree: () => void
  readonly onClear: () => void
  readonly onEnd: () => void
}

const NOBODY = ' '

/** Makes a beat of the selected buildings, or changes one. */
export function BeatForm({ round, edited, selectedIds, onSelectFree, onClear, onEnd }: BeatFormProps) {
  const { t } = useMessages()
  const api = useApi()
  const toast = useToast()
  const queries = useQueryClient()
  const surveyors = useQuery(surveyorsQuery(api))
  const [name, setName] = useState(edited?.name ?? t('rounds.beatName', { number: String(round.beats.length + 1) }))
  const [surveyorId, setSurveyorId] = useState<string>(edited?.surveyorId ?? NOBODY)
  const save = useMutation({
    mutationFn: () => {
      const body = { name, surveyorId: surveyorId === NOBODY ? null : surveyorId, outlineIds: [...selectedIds] }
      return edited
        ? api.call(changeBeat, { params: { roundId: round.roundId, beatId: edited.beatId }, body })
        : api.call(createBeat, { params: { roundId: round.roundId }, body })
    },
    onSuccess: (changed) => {
      queries.setQueryData(roundKeys.one(round.roundId), changed)
      toast(t('rounds.beatKept', { name }), 'good')
      onEnd()
    },
  })
  return (
    <View style={styles.form}>
      <View style={styles.row}>
        <Button kind="secondary" label={t('rounds.selectFree')} onPress={onSelectFree} />
        <Button kind="quiet" label={t('rounds.clearSelection')} onPress={onClear} disabled={selectedIds.length === 0} />
      </View>
      <TextField label={t('rounds.beat')} value={name} onChange={setName} />
      <Select
        label={t('rounds.surveyor')}
        value={surveyorId}
        onChange={setSurveyorId}
        options={[
          { value: NOBODY, label: t('rounds.nobodyYet') },
          ...(surveyors.data?.people ?? []).map((person) => ({ value: person.personId, label: person.name })),
        ]}
      />
      {save.error ? <ProblemNotice error={save.error} isSending /> : null}
      <View style={styles.row}>
        <Button
          kind="primary"
          label={edited ? t('rounds.keepBeat') : t('rounds.makeBeat')}
          onPress={() => save.mutate()}
          busy={save.isPending}
          disabled={selectedIds.length === 0 || name.trim() === ''}
        />
        {edited ? <Button kind="quiet" label={t('common.cancel')} onPress={onEnd} /> : null}
      </View>
    </View>
  )
}

const styles = StyleSheet.create({
  form: { gap: SPACE.medium },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.small },
})
