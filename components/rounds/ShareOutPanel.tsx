import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { CheckBox } from '@/components/ui/CheckBox'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { NumberField } from '@/components/ui/NumberField'
import { Panel } from '@/components/ui/Panel'
import { SPACE } from '@/components/ui/theme/tokens'
import { useToast } from '@/components/ui/Toast'
import { shareOutBeats, type RoundWithBeats } from '@/shared/api/rounds'
import { formatArea, formatCount, formatDistance } from '@/shared/format'
import { useApi } from '@/sync/react/SessionProvider'
import { planBeats, type PlannedBeat } from './planBeats'
import { districtOutlinesQuery, roundKeys, surveyorsQuery } from './roundQueries'

interface ShareOutPanelProps {
  readonly round: RoundWithBeats
  /** The proposal in sight; empty while there is none. */
  readonly planned: readonly PlannedBeat[]
  readonly onPlan: (planned: readonly PlannedBeat[]) => void
}

const MOST_BEATS = 60
const USUAL_BEAT = 100

/** Proposes beats for what has none, shows them on the map, and makes them all at once. */
export function ShareOutPanel({ round, planned, onPlan }: ShareOutPanelProps) {
  const { t } = useMessages()
  const api = useApi()
  const outlines = useQuery(districtOutlinesQuery(api, round.districtId))
  const free = round.buildings.filter(({ beatId }) => beatId === null).map(({ outlineId }) => outlineId)
  const [count, setCount] = useState<number | null>(Math.max(1, Math.ceil(free.length / USUAL_BEAT)))
  if (free.length === 0) return null
  const isCount = count !== null && Number.isInteger(count) && count >= 1 && count <= MOST_BEATS
  return (
    <Panel title={t('rounds.shareOut')} note={t('rounds.shareOutNote', { count: free.length })}>
      <AppText soft>{t('rounds.shareOutLead')}</AppText>
      <View style={styles.row}>
        <View style={styles.field}>
          <NumberField
            label={t('rounds.beatCount')}
            whole
            value={count}
            onChange={setCount}
            error={isCount ? undefined : t('rounds.beatCountFault', { most: MOST_BEATS })}
          />
        </View>
        <Button
          label={t('rounds.propose')}
          disabled={!isCount || !outlines.data}
          onPress={() => isCount && onPlan(planBeats(outlines.data?.features ?? [], new Set(free), count))}
        />
      </View>
      {planned.length > 0 ? <Proposal round={round} planned={planned} onPlan={onPlan} /> : null}
    </Panel>
  )
}

function Proposal({ round, planned, onPlan }: ShareOutPanelProps) {
  const { t, locale } = useMessages()
  const api = useApi()
  const toast = useToast()
  const queries = useQueryClient()
  const surveyors = useQuery(surveyorsQuery(api))
  const [chosenIds, setChosenIds] = useState<readonly string[]>([])
  const people = (surveyors.data?.people ?? []).filter(({ personId }) => chosenIds.includes(personId))
  const beats = planned.map((beat, place) => ({
    ...beat,
    name: t('rounds.beatName', { number: String(round.beats.length + place + 1) }),
    surveyor: people[place % Math.max(1, people.length)],
  }))
  const make = useMutation({
    mutationFn: () =>
      api.call(shareOutBeats, {
        params: { roundId: round.roundId },
        body: {
          beats: beats.map(({ name, surveyor, outlineIds }) => ({
            name,
            surveyorId: surveyor?.personId ?? null,
            outlineIds: [...outlineIds],
          })),
        },
      }),
    onSuccess: (changed) => {
      queries.setQueryData(roundKeys.one(round.roundId), changed)
      toast(t('rounds.beatsMade', { count: beats.length }), 'good')
      onPlan([])
    },
  })
  return (
    <>
      <View role="group" aria-label={t('rounds.whoWalks')} style={styles.people}>
        <AppText kind="label">{t('rounds.whoWalks')}</AppText>
        {(surveyors.data?.people ?? []).map(({ personId, name }) => (
          <CheckBox
            key={personId}
            label={name}
            checked={chosenIds.includes(personId)}
            onChange={(isChosen) =>
              setChosenIds(isChosen ? [...chosenIds, personId] : chosenIds.filter((other) => other !== personId))
            }
          />
        ))}
      </View>
      <DataTable
        label={t('rounds.proposal')}
        rows={beats}
        rowKey={({ name }) => name}
        columns={[
          { key: 'name', head: t('rounds.beat'), cell: ({ name }) => name },
          {
            key: 'surveyor',
            head: t('rounds.surveyor'),
            cell: ({ surveyor }) => surveyor?.name ?? t('rounds.nobodyYet'),
          },
          {
            key: 'buildings',
            head: t('rounds.buildings'),
            align: 'right',
            cell: ({ outlineIds }) => formatCount(outlineIds.length, locale),
          },
          {
            key: 'footprint',
            head: t('rounds.footprint'),
            align: 'right',
            cell: ({ footprintM2 }) => formatArea(footprintM2, locale),
          },
          { key: 'walk', head: t('rounds.walk'), align: 'right', cell: ({ walkM }) => formatDistance(walkM, locale) },
        ]}
      />
      <AppText soft>{t('rounds.walkNote')}</AppText>
      {make.error ? <ProblemNotice error={make.error} isSending /> : null}
      <View style={styles.row}>
        <Button
          kind="primary"
          label={t('rounds.makeBeats', { count: beats.length })}
          busy={make.isPending}
          onPress={() => make.mutate()}
        />
        <Button kind="quiet" label={t('common.cancel')} onPress={() => onPlan([])} />
      </View>
    </>
  )
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-end', gap: SPACE.medium },
  field: { flexBasis: 140, maxWidth: 200 },
  people: { gap: SPACE.tight },
})
