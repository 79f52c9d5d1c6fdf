import { useCallback, useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { BeatWall } from '@/components/charts/BeatWall'
import { useChosenBeat } from '@/components/field/useChosenBeat'
import { AppText } from '@/components/ui/AppText'
import { Badge } from '@/components/ui/Badge'
import { Button } from '@/components/ui/Button'
import { Choice } from '@/components/ui/Choice'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Screen } from '@/components/ui/Screen'
import { SPACE } from '@/components/ui/theme/tokens'
import type { FieldStore, StoredBeat, StoredBuilding } from '@/db/fieldStore.types'
import { formatCount, formatDate } from '@/shared/format'
import { useField, useHandInState, useStored } from '@/sync/react/FieldProvider'
import { WalkPanel } from '@/components/field/WalkPanel'
import { BagPanel } from './BagPanel'
import { LookNextPanel } from './LookNextPanel'
import { SentBackPanel } from './SentBackPanel'

interface TodayScreenProps {
  readonly onOpenSheet: (buildingId: string) => void
  readonly onOpenStreet: () => void
  readonly onOpenBag: () => void
}

const listBeats = (store: FieldStore) => store.listBeats()

/** The surveyor's day: the beat, the bag, what came back, where to look next. */
export function TodayScreen(props: TodayScreenProps) {
  const { t } = useMessages()
  const beats = useStored(listBeats)
  const { current, choose } = useChosenBeat(beats)
  if (!beats) return <Screen title={t('today.title')}>{null}</Screen>
  if (!current) return <NoBeat />
  return <TodayOfBeat {...props} beats={beats} current={current} onChoose={choose} />
}

function NetworkBadge() {
  const { t } = useMessages()
  const { network } = useHandInState()
  if (network === 'not-tried') return null
  const isReached = network === 'reached'
  return <Badge label={t(isReached ? 'common.online' : 'common.offline')} tone={isReached ? 'good' : 'attention'} />
}

function NoBeat() {
  const { t } = useMessages()
  const { handIn } = useField()
  const { phase } = useHandInState()
  const isBusy = phase !== 'resting' && phase !== 'waiting-to-retry'
  return (
    <Screen title={t('today.title')} right={<NetworkBadge />}>
      <EmptyState
        title={t('today.noBeat')}
        text={t('today.noBeatText')}
        action={<Button label={t('today.fetch')} busy={isBusy} onPress={() => void handIn.handIn()} />}
      />
    </Screen>
  )
}

interface TodayOfBeatProps extends TodayScreenProps {
  readonly beats: readonly StoredBeat[]
  readonly current: StoredBeat
  readonly onChoose: (beatId: string) => void
}

function TodayOfBeat({ beats, current, onChoose, onOpenSheet, onOpenStreet, onOpenBag }: TodayOfBeatProps) {
  const { t, locale } = useMessages()
  const { beatId, beat } = current
  const buildings = useStored(useCallback((store: FieldStore) => store.listBuildings(beatId), [beatId]))
  const [openedAt] = useState(() => new Date().toISOString())
  const wall = countStates(buildings ?? [])
  return (
    <Screen
      title={beat.roundName}
      subtitle={t('today.beatOn', { beat: beat.name, day: formatDate(openedAt, locale, 'weekday') })}
      right={<NetworkBadge />}
      width="form"
    >
      {beats.length > 1 ? (
        <Choice
          label={t('today.beat')}
          value={beatId}
          onChange={onChoose}
          options={beats.map((one) => ({
            value: one.beatId,
            label: t('today.beatOption', { beat: one.beat.name, round: one.beat.roundName }),
          }))}
        />
      ) : null}
      <Panel
        title={t('today.yourBeat')}
        note={t('today.progress', {
          done: formatCount(wall.handedIn + wall.inTheBag, locale),
          total: formatCount(beat.buildingCount, locale),
        })}
      >
        <BeatWall {...wall} />
        <View style={styles.action}>
          <Button kind="secondary" icon="map" label={t('today.openStreet')} onPress={onOpenStreet} />
        </View>
      </Panel>
      <BagPanel onOpenBag={onOpenBag} />
      <SentBackPanel buildings={buildings ?? []} onOpenSheet={onOpenSheet} />
      {buildings ? (
        <LookNextPanel buildings={buildings} onOpenSheet={onOpenSheet} />
      ) : (
        <AppText soft>{t('common.loading')}</AppText>
      )}
      <WalkPanel />
    </Screen>
  )
}

function countStates(buildings: readonly StoredBuilding[]) {
  const count = (...states: StoredBuilding['state'][]) => buildings.filter(({ state }) => states.includes(state)).length
  return {
    handedIn: count('handed-in', 'checked'),
    inTheBag: count('in-the-bag'),
    sentBack: count('sent-back'),
    toDo: count('to-do', 'started'),
  }
}

const styles = StyleSheet.create({ action: { paddingTop: SPACE.small, alignItems: 'flex-start' } })
