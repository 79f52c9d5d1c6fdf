import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Panel } from '@/components/ui/Panel'
import { SPACE } from '@/components/ui/theme/tokens'
import type { FieldStore, StoredConflict } from '@/db/fieldStore.types'
import type { SheetGroup } from '@/shared/schemas/sheet'
import { useField, useStored } from '@/sync/react/FieldProvider'
import { sayAnswer } from './sayAnswer'

const listConflicts = (store: FieldStore) => store.listConflicts()

/** Two answers to one question: who said what, and a choice that goes into the bag like any other work. */
export function ConflictsPanel() {
  const { t } = useMessages()
  const { store } = useField()
  const conflicts = useStored(listConflicts) ?? []
  const [fault, setFault] = useState<string | null>(null)
  const choose = async (conflictId: string, choice: 'kept' | 'set-aside') => {
    setFault(null)
    try {
      await store.settleConflict(conflictId, choice)
    } catch (error) {
      setFault(error instanceof Error ? error.message : String(error))
    }
  }
  if (conflicts.length === 0) return null
  return (
    <Panel title={t('bag.twoAnswers')} tone="attention">
      <AppText soft>{t('bag.twoAnswersText')}</AppText>
      {conflicts.map((conflict) => (
        <ConflictLines
          key={conflict.conflictId}
          conflict={conflict}
          onChoose={(choice) => void choose(conflict.conflictId, choice)}
        />
      ))}
      {fault ? <Notice tone="error" urgent whatHappened={fault} whatIsSafe={t('bag.safe')} /> : null}
    </Panel>
  )
}

interface ConflictLinesProps {
  readonly conflict: StoredConflict
  readonly onChoose: (choice: 'kept' | 'set-aside') => void
}

function ConflictLines({ conflict, onChoose }: ConflictLinesProps) {
  const { t, locale } = useMessages()
  const { group, label, keptByName, setAsideByName } = conflict
  const kept = sayAnswer(group, conflict.kept, t, locale)
  const setAside = sayAnswer(group, conflict.setAside, t, locale)
  const groupName = group === 'deletion' ? t('bag.deletion') : t(`sheet.group.${group as SheetGroup}`)
  return (
    <View style={styles.entry}>
      <AppText weight="semibold">{t('bag.group', { label, group: groupName })}</AppText>
      <AppText>{t('bag.counts', { value: kept, name: keptByName })}</AppText>
      <AppText>{t('bag.setAside', { value: setAside, name: setAsideByName })}</AppText>
      <View style={styles.choices}>
        <Button kind="secondary" label={t('bag.choose', { value: kept })} onPress={() => onChoose('kept')} />
        <Button kind="secondary" label={t('bag.choose', { value: setAside })} onPress={() => onChoose('set-aside')} />
      </View>
    </View>
  )
}

const styles = StyleSheet.create({
  entry: { paddingTop: SPACE.small, gap: SPACE.tight },
  choices: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.small },
})
