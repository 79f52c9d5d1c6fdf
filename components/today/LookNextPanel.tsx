import { Pressable, StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { SPACE, TARGET } from '@/components/ui/theme/tokens'
import { buildingLabel } from '@/db/buildingLabel'
import type { StoredBuilding } from '@/db/fieldStore.types'
import { formatArea } from '@/shared/format'

interface LookNextPanelProps {
  readonly buildings: readonly StoredBuilding[]
  readonly onOpenSheet: (buildingId: string) => void
}

const MOST = 5

/** The largest buildings that nobody has recorded yet, begun ones first, each with its reason. */
export function LookNextPanel({ buildings, onOpenSheet }: LookNextPanelProps) {
  const { t, locale } = useMessages()
  const { colours } = useTheme()
  const next = lookNext(buildings)
  return (
    <Panel title={t('today.next')} note={next.length > 0 ? t('today.nextNote') : undefined}>
      {next.length === 0 ? <AppText>{t('today.allRecorded')}</AppText> : null}
      {next.map((one) => {
        const label = buildingLabel(one.building.outline)
        return (
          <Pressable
            key={one.buildingId}
            role="button"
            aria-label={t('today.openSheet', { label })}
            onPress={() => onOpenSheet(one.buildingId)}
            style={[styles.row, { borderColor: colours.hairline }]}
          >
            <View style={styles.words}>
              <AppText kind="lead" weight="semibold">
                {label}
              </AppText>
              <AppText soft>{t(reasonOf(one))}</AppText>
            </View>
            <AppText soft>{formatArea(one.building.outline.footprintM2, locale)}</AppText>
          </Pressable>
        )
      })}
    </Panel>
  )
}

function lookNext(buildings: readonly StoredBuilding[]): readonly StoredBuilding[] {
  return buildings
    .filter(({ state }) => state === 'started' || state === 'to-do')
    .sort(
      (a, b) =>
        Number(b.state === 'started') - Number(a.state === 'started') ||
        b.building.outline.footprintM2 - a.building.outline.footprintM2,
    )
    .slice(0, MOST)
}

function reasonOf({ state, building }: StoredBuilding) {
  if (state === 'started') return 'today.reasonStarted'
  return building.outline.register.year === null ? 'today.reasonLargeAgeUnknown' : 'today.reasonLarge'
}

const styles = StyleSheet.create({
  row: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: SPACE.medium,
    minHeight: TARGET,
    paddingVertical: SPACE.small,
    borderBottomWidth: 1,
  },
  words: { flex: 1 },
})
