import { Pressable, StyleSheet, View } from 'react-native'
import { lookFigureText } from '@/components/nextLook/lookFigureText'
import { lookReasonText } from '@/components/nextLook/lookReasonText'
import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { SPACE, TARGET } from '@/components/ui/theme/tokens'
import { buildingLabel } from '@/db/buildingLabel'
import type { FieldStore, StoredBuilding } from '@/db/fieldStore.types'
import { formatArea, formatShare } from '@/shared/format'
import type { Messages } from '@/shared/messages/messages.types'
import type { DeviceLooks } from '@/shared/schemas/nextLook'
import { useStored } from '@/sync/react/FieldProvider'
import { nextOnBeat, type NextBuilding } from './nextOnBeat'

interface LookNextPanelProps {
  readonly buildings: readonly StoredBuilding[]
  readonly onOpenSheet: (buildingId: string) => void
}

const readNextLooks = (store: FieldStore) => store.readNextLooks()

/** The buildings that make the round's figure surest, begun ones first, each with its reason; kept on this device. */
export function LookNextPanel({ buildings, onOpenSheet }: LookNextPanelProps) {
  const { t } = useMessages()
  const lists = useStored(readNextLooks)
  const roundId = buildings[0]?.building.roundId
  const list = lists?.find((one) => one.roundId === roundId && one.looks.length > 0) ?? null
  const next = nextOnBeat(buildings, list)
  return (
    <Panel title={t('today.next')} note={next.length > 0 && !list ? t('today.nextNote') : undefined}>
      {next.length === 0 ? <AppText>{t('today.allRecorded')}</AppText> : null}
      {next.length > 0 ? (
        <AppText soft size="small">
          {list ? t('nextLook.forFigure', { figure: lookFigureText(list.figure, t) }) : t('nextLook.largestFirst')}
        </AppText>
      ) : null}
      {next.map((one) => (
        <Row key={one.stored.buildingId} one={one} list={list} onOpenSheet={onOpenSheet} />
      ))}
    </Panel>
  )
}

interface RowProps extends Pick<LookNextPanelProps, 'onOpenSheet'> {
  readonly one: NextBuilding
  readonly list: DeviceLooks | null
}

function Row({ one, list, onOpenSheet }: RowProps) {
  const messages = useMessages()
  const { t, locale } = messages
  const { colours } = useTheme()
  const { stored, look } = one
  const label = buildingLabel(stored.building.outline)
  const place =
    look && list
      ? `${t('nextLook.rank', { rank: look.rank, count: list.roundCount })} · ${t('nextLook.share', { share: formatShare(look.settleShare, locale) })}`
      : null
  return (
    <Pressable
      role="button"
      aria-label={t('today.openSheet', { label })}
      onPress={() => onOpenSheet(stored.buildingId)}
      style={[styles.row, { borderColor: colours.hairline }]}
    >
      <View style={styles.words}>
        <AppText kind="lead" weight="semibold">
          {label}
        </AppText>
        <AppText soft>{reasonOf(one, messages)}</AppText>
        {place ? (
          <AppText soft size="small">
            {place}
          </AppText>
        ) : null}
      </View>
      <AppText soft>{formatArea(stored.building.outline.footprintM2, locale)}</AppText>
    </Pressable>
  )
}

function reasonOf({ stored: { state, building }, look }: NextBuilding, { t }: Messages): string {
  if (state === 'started') return t('today.reasonStarted')
  if (look) return lookReasonText(look.reason, look.isRecorded, t)
  return t(building.outline.register.year === null ? 'today.reasonLargeAgeUnknown' : 'today.reasonLarge')
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
