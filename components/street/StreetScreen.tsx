import { useCallback, useMemo, useState } from 'react'
import { ScrollView, StyleSheet, View } from 'react-native'
import { MapLegend } from '@/components/map/MapLegend'
import { OutlineMap } from '@/components/map/OutlineMap'
import { useChosenBeat } from '@/components/field/useChosenBeat'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { CheckBox } from '@/components/ui/CheckBox'
import { Choice } from '@/components/ui/Choice'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Screen } from '@/components/ui/Screen'
import { TextField } from '@/components/ui/TextField'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { SPACE } from '@/components/ui/theme/tokens'
import { useWide } from '@/components/ui/theme/useWide'
import { buildingLabel } from '@/db/buildingLabel'
import type { FieldStore, StoredBeat, StoredBuilding } from '@/db/fieldStore.types'
import { DEVICE_SHEET_STATES } from '@/shared/schemas/sheet'
import { formatDistance } from '@/shared/format'
import { useStored } from '@/sync/react/FieldProvider'
import { BuildingList } from './BuildingList'
import { lookPaint, LOOK_SHADES } from './lookShade'
import { fitsSearch, orderBuildings } from './orderBuildings'
import { PaintMark } from './PaintMark'
import { statePaint } from './statePaint'
import { useLookShades } from './useLookShades'
import { useOwnPosition } from './useOwnPosition'
import { WalkCaution } from './WalkCaution'

interface StreetScreenProps {
  readonly onOpenSheet: (buildingId: string) => void
}

const listBeats = (store: FieldStore) => store.listBeats()

/** The beat's footprints on a map that needs no network, and the same as a list by distance. */
export function StreetScreen({ onOpenSheet }: StreetScreenProps) {
  const { t } = useMessages()
  const beats = useStored(listBeats)
  const { current, choose } = useChosenBeat(beats)
  if (!beats) {
    return (
      <Screen title={t('street.title')}>
        <AppText soft>{t('common.loading')}</AppText>
      </Screen>
    )
  }
  if (!current) {
    return (
      <Screen title={t('street.title')}>
        <EmptyState title={t('today.noBeat')} text={t('today.noBeatText')} />
      </Screen>
    )
  }
  return <Street beats={beats} current={current} onChoose={choose} onOpenSheet={onOpenSheet} />
}

interface StreetProps extends StreetScreenProps {
  readonly beats: readonly StoredBeat[]
  readonly current: StoredBeat
  readonly onChoose: (beatId: string) => void
}

function Street({ beats, current, onChoose, onOpenSheet }: StreetProps) {
  const { t, locale } = useMessages()
  const isWide = useWide()
  const { beatId, beat } = current
  const buildings = useStored(useCallback((store: FieldStore) => store.listBuildings(beatId), [beatId]))
  const [view, setView] = useState<'map' | 'list'>('map')
  const [words, setWords] = useState('')
  const { locating, position, locate, isFollowing, follow } = useOwnPosition()
  const ordered = useMemo(() => orderBuildings(buildings ?? [], position), [buildings, position])
  const found = ordered.filter(({ stored }) => fitsSearch(stored, words))
  const nearest = ordered.find(({ stored }) => stored.state === 'to-do')
  const says =
    locating === 'found' && position
      ? t('street.position', { distance: formatDistance(position.accuracyM, locale) })
      : locating === 'not-asked'
        ? t('street.byStreet')
        : t(LOCATING[locating])
  const isListShown = view === 'list' || words !== ''
  const list = (
    <View style={styles.list}>
      <TextField label={t('street.search')} hint={t('street.searchHint')} value={words} onChange={setWords} />
      {buildings ? (
        <>
          <AppText soft>{`${t('street.found', { count: found.length })} · ${says}`}</AppText>
          <BuildingList buildings={found} onOpen={onOpenSheet} />
        </>
      ) : (
        <AppText soft>{t('common.loading')}</AppText>
      )}
    </View>
  )
  const map = (
    <BeatMap
      label={t('street.map', { beat: beat.name })}
      beatId={beatId}
      buildings={buildings ?? []}
      position={position}
      followsUser={isFollowing}
      onOpenSheet={onOpenSheet}
    />
  )
  return (
    <Screen
      title={t('street.title')}
      subtitle={beat.name}
      fill
      footer={
        <>
          <Button
            kind="secondary"
            icon="locate"
            grow
            label={t('street.locate')}
            busy={locating === 'locating'}
            onPress={locate}
          />
          <Button
            grow
            label={t('street.nearest')}
            disabled={!nearest}
            onPress={() => (nearest ? onOpenSheet(nearest.stored.buildingId) : undefined)}
          />
        </>
      }
      aside={isWide ? list : undefined}
    >
      <View style={styles.controls}>
        {beats.length > 1 ? (
          <Choice
            label={t('street.beat')}
            value={beatId}
            onChange={onChoose}
            options={beats.map((one) => ({
              value: one.beatId,
              label: t('today.beatOption', { beat: one.beat.name, round: one.beat.roundName }),
            }))}
          />
        ) : null}
        {isWide ? null : (
          <Choice
            label={t('street.view')}
            layout="segments"
            value={view}
            onChange={setView}
            options={[
              { value: 'map', label: t('street.showMap') },
              { value: 'list', label: t('street.showList') },
            ]}
          />
        )}
        <CheckBox label={t('street.follow')} checked={isFollowing} onChange={follow} />
        <WalkCaution />
        {locating === 'denied' || locating === 'failed' ? <AppText tone="attention">{says}</AppText> : null}
      </View>
      {isWide || !isListShown ? (
        <View style={styles.map}>{map}</View>
      ) : (
        <ScrollView style={styles.map}>{list}</ScrollView>
      )}
    </Screen>
  )
}

const LOCATING = {
  locating: 'street.locating',
  found: 'street.byDistance',
  denied: 'street.positionDenied',
  failed: 'street.positionFailed',
} as const

interface BeatMapProps {
  readonly label: string
  readonly beatId: string
  readonly buildings: readonly StoredBuilding[]
  readonly position: ReturnType<typeof useOwnPosition>['position']
  readonly followsUser: boolean
  readonly onOpenSheet: (buildingId: string) => void
}

function BeatMap({ label, beatId, buildings, position, followsUser, onOpenSheet }: BeatMapProps) {
  const { t } = useMessages()
  const { colours } = useTheme()
  const stateOf = useMemo(() => new Map(buildings.map(({ buildingId, state }) => [buildingId, state])), [buildings])
  const outlines = useMemo(
    () =>
      buildings.map(({ buildingId, building }) => ({
        id: buildingId,
        geometry: building.geometry,
        name: buildingLabel(building.outline),
      })),
    [buildings],
  )
  const shades = useLookShades(buildings)
  const paint = useCallback(
    (id: string) => {
      const state = stateOf.get(id) ?? 'to-do'
      const shade = state === 'to-do' ? shades.get(id) : undefined
      return shade ? lookPaint(shade, colours) : statePaint(state, colours)
    },
    [stateOf, shades, colours],
  )
  const lookEntries = LOOK_SHADES.map((shade) => ({
    key: shade,
    label: t(`nextLook.${shade}`),
    mark: <PaintMark paint={lookPaint(shade, colours)} />,
  }))
  const stateEntries = DEVICE_SHEET_STATES.map((state) => ({
    key: state,
    label: t(`vocabulary.state.${state}`),
    mark: <PaintMark paint={statePaint(state, colours)} />,
  }))
  const entries = shades.size > 0 ? [...lookEntries, ...stateEntries] : stateEntries
  return (
    <OutlineMap
      label={label}
      outlines={outlines}
      paint={paint}
      onPress={onOpenSheet}
      userPosition={position}
      followsUser={followsUser}
      fitKey={`${beatId} ${buildings.length}`}
      overlay={<MapLegend title={t('street.state')} entries={entries} />}
    />
  )
}

const styles = StyleSheet.create({
  controls: { paddingHorizontal: SPACE.medium, paddingVertical: SPACE.small, gap: SPACE.small },
  map: { flex: 1, minHeight: 0 },
  list: { padding: SPACE.medium, gap: SPACE.small },
})
