import { useCallback } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { SPACE } from '@/components/ui/theme/tokens'
import { buildingLabel } from '@/db/buildingLabel'
import type { FieldStore } from '@/db/fieldStore.types'
import type { SheetAnswers, SheetGroup } from '@/shared/schemas/sheet'
import { useStored } from '@/sync/react/FieldProvider'
import type { SectionProps } from './form.types'
import { lastRecorded } from './lastRecorded'
import { sameAsLast } from './sameAsLast'

interface SheetStartProps extends Pick<SectionProps, 'answers' | 'unconfirmed' | 'confirm'> {
  readonly buildingId: string
  readonly onOffer: (answers: SheetAnswers) => void
}

/** At the head of a sheet: what can be taken over from the neighbour, and what is still to be confirmed. */
export function SheetStart({ buildingId, answers, unconfirmed, confirm, onOffer }: SheetStartProps) {
  const { t } = useMessages()
  const lastId = lastRecorded()
  const last = useStored(
    useCallback(
      (store: FieldStore) => (lastId && lastId !== buildingId ? store.readBuilding(lastId) : Promise.resolve(null)),
      [lastId, buildingId],
    ),
  )
  const suggested = last ? sameAsLast(last.answers, answers) : {}
  const groups = Object.keys(unconfirmed) as SheetGroup[]
  const canTake = last && Object.keys(suggested).length > 0
  if (!canTake && groups.length === 0) return null
  return (
    <View style={styles.stack}>
      {groups.length > 0 ? <AppText soft>{t('sheet.unconfirmedCount', { count: groups.length })}</AppText> : null}
      <View style={styles.row}>
        {canTake ? (
          <Button
            grow
            label={t('sheet.sameAsLast', { label: buildingLabel(last.building.outline) })}
            onPress={() => onOffer(suggested)}
          />
        ) : null}
        {groups.length > 1 ? (
          <Button grow icon="check" label={t('sheet.confirmAll')} onPress={() => confirm(groups)} />
        ) : null}
      </View>
    </View>
  )
}

const styles = StyleSheet.create({
  stack: { gap: SPACE.small },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.small },
})
