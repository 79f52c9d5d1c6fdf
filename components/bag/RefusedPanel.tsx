import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { SPACE } from '@/components/ui/theme/tokens'
import type { BagContents } from '@/db/fieldStore.types'
import type { Translate } from '@/shared/messages/messages.types'
import { SHEET_GROUPS } from '@/shared/schemas/sheet'

interface RefusedPanelProps {
  readonly quarantined: BagContents['quarantined']
  readonly onOpenSheet: (buildingId: string) => void
}

/** What the server could not take, why, and the way to mend it. */
export function RefusedPanel({ quarantined, onOpenSheet }: RefusedPanelProps) {
  const { t } = useMessages()
  if (quarantined.length === 0) return null
  return (
    <Panel title={t('bag.refused')} tone="error">
      <AppText soft>{t('bag.refusedText')}</AppText>
      {quarantined.map(({ mutationId, label, problem, buildingId }) => (
        <View key={mutationId} style={styles.entry}>
          <AppText weight="semibold">{label}</AppText>
          <AppText>{problem.detail}</AppText>
          {problem.faults.map((fault) => (
            <AppText key={`${fault.pointer} ${fault.code}`} soft>
              {[fieldNameOf(fault.pointer, t), fault.detail].filter(Boolean).join(': ')}
            </AppText>
          ))}
          <Button kind="quiet" label={t('bag.mend', { label })} onPress={() => onOpenSheet(buildingId)} />
        </View>
      ))}
    </Panel>
  )
}

/** The name of the answer a pointer such as `/set/storeys/aboveGround` leads to; null where it leads to none. */
function fieldNameOf(pointer: string, t: Translate): string | null {
  const group = SHEET_GROUPS.find((one) => pointer.split('/').includes(one))
  return group ? t(`sheet.group.${group}`) : null
}

const styles = StyleSheet.create({ entry: { paddingTop: SPACE.small, gap: SPACE.tight, alignItems: 'flex-start' } })
