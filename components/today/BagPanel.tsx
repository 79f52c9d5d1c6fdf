import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { SPACE } from '@/components/ui/theme/tokens'
import type { FieldStore } from '@/db/fieldStore.types'
import { formatBytes, formatDate } from '@/shared/format'
import { useField, useHandInState, useStored } from '@/sync/react/FieldProvider'

const readBag = (store: FieldStore) => store.readBag()

/** What is on this phone and not yet with the server, and the button that sends it. */
export function BagPanel({ onOpenBag }: { readonly onOpenBag: () => void }) {
  const { t, locale } = useMessages()
  const { handIn } = useField()
  const { phase, stoppedBecause } = useHandInState()
  const bag = useStored(readBag)
  if (!bag) return null
  const isBusy = phase === 'sending' || phase === 'fetching' || phase === 'sending-photos'
  const isEmpty = bag.sheetCount === 0 && bag.photoCount === 0
  const parts = [
    ...(bag.photoCount > 0 ? [t('common.photos', { count: bag.photoCount }), formatBytes(bag.photoBytes, locale)] : []),
    bag.lastHandedInAt
      ? t('today.lastHandedIn', { time: formatDate(bag.lastHandedInAt, locale, 'time') })
      : t('today.neverHandedIn'),
  ]
  return (
    <Panel title={t('today.bag')} note={t(isEmpty ? 'today.bagEmptyNote' : 'today.bagKept')}>
      <View style={styles.row}>
        <View style={styles.words}>
          <AppText kind="figure">
            {isEmpty ? t('today.bagEmpty') : t('common.sheets', { count: bag.sheetCount })}
          </AppText>
          <AppText soft>{parts.join(' · ')}</AppText>
        </View>
        <Button kind="primary" label={t('bag.handIn')} busy={isBusy} onPress={() => void handIn.handIn()} />
      </View>
      {stoppedBecause ? (
        <AppText tone="attention">
          {`${t(`bag.stopped.${stoppedBecause}`)} ${t(`bag.whatToDo.${stoppedBecause}`)}`}
        </AppText>
      ) : null}
      {bag.quarantined.length > 0 ? (
        <Button
          kind="quiet"
          icon="warning"
          label={t('today.refused', { count: bag.quarantined.length })}
          onPress={onOpenBag}
        />
      ) : null}
    </Panel>
  )
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', alignItems: 'center', gap: SPACE.medium },
  words: { flex: 1 },
})
