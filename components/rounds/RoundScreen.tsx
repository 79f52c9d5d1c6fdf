import { useQuery } from '@tanstack/react-query'
import { useLocalSearchParams, useRouter, type Href } from 'expo-router'
import { useState } from 'react'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Progress } from '@/components/ui/Progress'
import { Screen } from '@/components/ui/Screen'
import { BeatWall } from '@/components/charts/BeatWall'
import type { Beat, RoundWithBeats } from '@/shared/api/rounds'
import { formatDate } from '@/shared/format'
import { useApi } from '@/sync/react/SessionProvider'
import { BeatForm } from './BeatForm'
import { BeatTable } from './BeatTable'
import { BlockList } from './BlockList'
import { RoundMap } from './RoundMap'
import { ShareOutPanel } from './ShareOutPanel'
import type { PlannedBeat } from './planBeats'
import { roundQuery } from './roundQueries'

/** A round: its coverage, its beats, and the map from which beats are made. */
export function RoundScreen() {
  const { t, locale } = useMessages()
  const router = useRouter()
  const { roundId } = useLocalSearchParams<{ roundId: string }>()
  const api = useApi()
  const round = useQuery(roundQuery(api, roundId))
  return (
    <Screen
      title={round.data?.name ?? t('rounds.round')}
      subtitle={
        round.data
          ? `${round.data.districtName} · ${formatDate(round.data.startsOn, locale)} – ${formatDate(round.data.endsOn, locale)}`
          : undefined
      }
      onBack={() => router.navigate('/rounds' as Href)}
      width="report"
    >
      {round.isPending ? <Progress label={t('common.loading')} share={null} /> : null}
      {round.error ? <ProblemNotice error={round.error} onRetry={() => void round.refetch()} /> : null}
      {round.data ? <RoundBody round={round.data} /> : null}
    </Screen>
  )
}

function RoundBody({ round }: { readonly round: RoundWithBeats }) {
  const { t } = useMessages()
  const [selectedIds, setSelectedIds] = useState<readonly string[]>([])
  const [edited, setEdited] = useState<Beat | null>(null)
  const [planned, setPlanned] = useState<readonly PlannedBeat[]>([])
  const { coverage } = round
  const toggle = (outlineIds: readonly string[]) =>
    setSelectedIds((now) => {
      const isOn = outlineIds.every((outlineId) => now.includes(outlineId))
      const rest = now.filter((outlineId) => !outlineIds.includes(outlineId))
      return isOn ? rest : [...rest, ...outlineIds]
    })
  const handleEdit = (beat: Beat) => {
    setEdited(beat)
    setSelectedIds(round.buildings.filter(({ beatId }) => beatId === beat.beatId).map(({ outlineId }) => outlineId))
  }
  const handleEnd = () => {
    setEdited(null)
    setSelectedIds([])
  }
  return (
    <>
      <Panel title={t('rounds.coverage')}>
        <BeatWall
          handedIn={coverage.handedInCount + coverage.checkedCount}
          inTheBag={0}
          sentBack={coverage.sentBackCount}
          toDo={coverage.toDoCount}
        />
      </Panel>
      <Panel title={t('rounds.beats')}>
        <BeatTable round={round} onEdit={handleEdit} />
      </Panel>
      <ShareOutPanel round={round} planned={planned} onPlan={setPlanned} />
      <Panel
        title={edited ? t('rounds.changeBeat', { name: edited.name }) : t('rounds.makeBeat')}
        note={t('rounds.selected', { count: selectedIds.length })}
      >
        <RoundMap
          round={round}
          selectedIds={selectedIds}
          onToggle={(outlineId) => toggle([outlineId])}
          planned={planned}
          onAdd={(outlineIds) => setSelectedIds((now) => [...new Set([...now, ...outlineIds])])}
        />
        <BeatForm
          key={edited?.beatId ?? 'new'}
          round={round}
          edited={edited}
          selectedIds={selectedIds}
          onSelectFree={() =>
            setSelectedIds(round.buildings.filter(({ beatId }) => beatId === null).map(({ outlineId }) => outlineId))
          }
          onClear={() => setSelectedIds([])}
          onEnd={handleEnd}
        />
        <BlockList round={round} selectedIds={selectedIds} onToggle={toggle} />
      </Panel>
    </>
  )
}
