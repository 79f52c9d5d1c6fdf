import { useState } from 'react'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { DataTable } from '@/components/ui/DataTable'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Screen } from '@/components/ui/Screen'
import { downloadText } from '@/components/ui/web/downloadText'
import type { BagContents, FieldStore } from '@/db/fieldStore.types'
import { formatBytes, formatDate } from '@/shared/format'
import { useField, useHandInState, useStored } from '@/sync/react/FieldProvider'
import { ConflictsPanel } from './ConflictsPanel'
import { HandInStatus } from './HandInStatus'
import { RefusedPanel } from './RefusedPanel'
import { SpacePanel } from './SpacePanel'

interface BagScreenProps {
  readonly onOpenSheet: (buildingId: string) => void
  readonly onSignIn: () => void
}

const readBag = (store: FieldStore) => store.readBag()

/** What is on this phone and where it has got to, what was refused and why, and how it leaves. */
export function BagScreen({ onOpenSheet, onSignIn }: BagScreenProps) {
  const { t, locale } = useMessages()
  const { handIn } = useField()
  const { phase } = useHandInState()
  const bag = useStored(readBag)
  const isBusy = phase === 'sending' || phase === 'fetching' || phase === 'sending-photos'
  if (!bag) return <Screen title={t('bag.title')}>{null}</Screen>
  const counts = [t('common.sheets', { count: bag.sheetCount }), t('common.photos', { count: bag.photoCount })]
  return (
    <Screen
      title={t('bag.title')}
      subtitle={[...counts, formatBytes(bag.photoBytes, locale)].join(' · ')}
      width="form"
      footer={<Button kind="primary" grow label={t('bag.handIn')} busy={isBusy} onPress={() => void handIn.handIn()} />}
    >
      <HandInStatus onSignIn={onSignIn} />
      <RefusedPanel quarantined={bag.quarantined} onOpenSheet={onOpenSheet} />
      <ConflictsPanel />
      <WaitingPanel bag={bag} onOpenSheet={onOpenSheet} />
      <SpacePanel />
      <CopyPanel />
    </Screen>
  )
}

function WaitingPanel({ bag, onOpenSheet }: { bag: BagContents; onOpenSheet: (buildingId: string) => void }) {
  const { t, locale } = useMessages()
  const when = bag.lastHandedInAt
    ? t('bag.lastHandedIn', { time: formatDate(bag.lastHandedInAt, locale, 'day-and-time') })
    : t('bag.neverHandedIn')
  return (
    <Panel title={t('bag.waiting')} note={t('common.sheets', { count: bag.sheetCount })}>
      {bag.entries.length === 0 ? (
        <EmptyState title={t('bag.empty')} text={t('bag.emptyText')} />
      ) : (
        <DataTable
          label={t('bag.waiting')}
          rows={[...bag.entries]}
          rowKey={({ kind, mutationId }) => `${kind} ${mutationId}`}
          rowLabel={({ label, kind, place }) =>
            t('bag.entry', { label, kind: t(`bag.${kind}`), place: t(`bag.${place}`) })
          }
          onPressRow={({ buildingId }) => onOpenSheet(buildingId)}
          columns={[
            { key: 'building', head: t('bag.column.building'), cell: ({ label }) => label },
            { key: 'what', head: t('bag.column.what'), cell: ({ kind }) => t(`bag.${kind}`) },
            { key: 'where', head: t('bag.column.where'), cell: ({ place }) => t(`bag.${place}`) },
          ]}
        />
      )}
      {bag.startedCount > 0 ? <AppText>{t('bag.startedCount', { count: bag.startedCount })}</AppText> : null}
      <AppText soft>{t('bag.threeFacts')}</AppText>
      <AppText soft>{when}</AppText>
    </Panel>
  )
}

function CopyPanel() {
  const { t } = useMessages()
  const { store } = useField()
  const [saved, setSaved] = useState<string | null>(null)
  const save = async () => {
    const { fileName, json } = await store.exportBag()
    downloadText(fileName, json, 'application/json')
    setSaved(fileName)
  }
  return (
    <Panel title={t('bag.saveCopy')}>
      <AppText soft>{t('bag.saveCopyText')}</AppText>
      <Button kind="secondary" icon="download" label={t('bag.saveCopy')} onPress={() => void save()} />
      {saved ? <AppText tone="good">{t('bag.copySaved', { name: saved })}</AppText> : null}
    </Panel>
  )
}
