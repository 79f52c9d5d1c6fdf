import { Pressable, StyleSheet, View } from 'react-native'
import { useState } from 'react'
import { AppText } from '@/components/ui/AppText'
import { Badge } from '@/components/ui/Badge'
import { Button } from '@/components/ui/Button'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { SPACE, TARGET, type Tone } from '@/components/ui/theme/tokens'
import { buildingLabel } from '@/db/buildingLabel'
import type { DeviceSheetState } from '@/shared/schemas/sheet'
import { formatArea, formatDistance } from '@/shared/format'
import type { PlacedBuilding } from './orderBuildings'

interface BuildingListProps {
  readonly buildings: readonly PlacedBuilding[]
  readonly onOpen: (buildingId: string) => void
}

const PAGE = 60

const TONES: Readonly<Record<DeviceSheetState, Tone>> = {
  'to-do': 'ink',
  started: 'attention',
  'in-the-bag': 'action',
  'handed-in': 'good',
  checked: 'good',
  'sent-back': 'error',
}

/** The buildings of the beat one under the other, for everybody and for who cannot use a map. */
export function BuildingList({ buildings, onOpen }: BuildingListProps) {
  const { t } = useMessages()
  const [shown, setShown] = useState(PAGE)
  if (buildings.length === 0) {
    return <EmptyState title={t('street.nothingFound')} text={t('street.nothingFoundText')} />
  }
  return (
    <View>
      <View role="list">
        {buildings.slice(0, shown).map((placed) => (
          <Row key={placed.stored.buildingId} placed={placed} onOpen={onOpen} />
        ))}
      </View>
      {buildings.length > shown ? (
        <Button
          kind="quiet"
          label={t('common.showMore', { count: Math.min(PAGE, buildings.length - shown) })}
          onPress={() => setShown(shown + PAGE)}
        />
      ) : null}
    </View>
  )
}

function Row({ placed, onOpen }: { placed: PlacedBuilding; onOpen: (buildingId: string) => void }) {
  const { t, locale } = useMessages()
  const { colours } = useTheme()
  const { stored, distanceM } = placed
  const { outline } = stored.building
  const label = buildingLabel(outline)
  const state = t(`vocabulary.state.${stored.state}`)
  const area = formatArea(outline.footprintM2, locale)
  return (
    <View role="listitem">
      <Pressable
        role="button"
        aria-label={t('street.openSheet', { label, state })}
        onPress={() => onOpen(stored.buildingId)}
        style={[styles.row, { borderColor: colours.hairline }]}
      >
        <View style={styles.words}>
          <AppText weight="semibold">{label}</AppText>
          <AppText soft size="small">
            {[outline.reference, area, ...(distanceM === null ? [] : [formatDistance(distanceM, locale)])].join(' · ')}
          </AppText>
        </View>
        <Badge label={state} tone={TONES[stored.state]} />
      </Pressable>
    </View>
  )
}

const styles = StyleSheet.create({
  row: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: SPACE.medium,
    minHeight: TARGET + SPACE.small,
    paddingVertical: SPACE.small,
    borderBottomWidth: 1,
  },
  words: { flex: 1 },
})
