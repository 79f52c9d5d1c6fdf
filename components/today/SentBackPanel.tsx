import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { SPACE } from '@/components/ui/theme/tokens'
import type { StoredBuilding } from '@/db/fieldStore.types'
import { buildingLabel } from '@/db/buildingLabel'
import { formatCount } from '@/shared/format'

interface SentBackPanelProps {
  readonly buildings: readonly StoredBuilding[]
  readonly onOpenSheet: (buildingId: string) => void
}

/** Sheets that a planner returned, each with its question; nothing when there are none. */
export function SentBackPanel({ buildings, onOpenSheet }: SentBackPanelProps) {
  const { t, locale } = useMessages()
  const sentBack = buildings.filter(({ state }) => state === 'sent-back')
  if (sentBack.length === 0) return null
  return (
    <Panel title={t('today.sentBack')} note={formatCount(sentBack.length, locale)} tone="error">
      {sentBack.map(({ buildingId, building, question }) => {
        const label = buildingLabel(building.outline)
        return (
          <View key={buildingId} style={styles.row}>
            <View style={styles.words}>
              <AppText kind="lead" weight="semibold">
                {label}
              </AppText>
              {question ? <AppText soft>{t('today.question', { question })}</AppText> : null}
            </View>
            <Button
              kind="quiet"
              label={t('common.open')}
              accessibleLabel={t('today.openSheet', { label })}
              onPress={() => onOpenSheet(buildingId)}
            />
          </View>
        )
      })}
    </Panel>
  )
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', alignItems: 'center', gap: SPACE.medium },
  words: { flex: 1 },
})
