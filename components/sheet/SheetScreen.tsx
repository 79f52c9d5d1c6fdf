import { useCallback, useEffect, useMemo, useRef, useState } from 'react'
import { Badge } from '@/components/ui/Badge'
import { Button } from '@/components/ui/Button'
import { EmptyState } from '@/components/ui/EmptyState'
import { IconButton } from '@/components/ui/IconButton'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Progress } from '@/components/ui/Progress'
import { Screen } from '@/components/ui/Screen'
import { TextField } from '@/components/ui/TextField'
import { TitleBlock } from '@/components/ui/TitleBlock'
import { useToast } from '@/components/ui/Toast'
import { buildingLabel } from '@/db/buildingLabel'
import type { FieldStore, StoredSheet } from '@/db/fieldStore.types'
import { revisionLetter } from '@/shared/schemas/sheet'
import { formatArea, formatDate } from '@/shared/format'
import { useStored } from '@/sync/react/FieldProvider'
import { useAccount } from '@/sync/react/SessionProvider'
import { BigSection } from './BigSection'
import { ConditionSection } from './ConditionSection'
import { EstimatePanel } from './EstimatePanel'
import { MadeSection } from './MadeSection'
import { OldSection } from './OldSection'
import { PhotosSection } from './PhotosSection'
import { PartsSection } from './PartsSection'
import { sectionFaults } from './sectionFaults'
import { SheetNotices } from './SheetNotices'
import { SheetStart } from './SheetStart'
import { usableAnswers } from './usableAnswers'
import { useSheetForm } from './useSheetForm'
import { WhatSection } from './WhatSection'
import { WhereSection } from './WhereSection'

interface SheetScreenProps {
  readonly buildingId: string
  readonly onBack: () => void
}

/** One building's record: every change is kept the moment it is made. */
export function SheetScreen({ buildingId, onBack }: SheetScreenProps) {
  const { t } = useMessages()
  const stored = useStored(useCallback((store: FieldStore) => store.readSheet(buildingId), [buildingId]))
  if (stored === undefined) {
    return (
      <Screen title={t('nav.sheet')} onBack={onBack} width="form">
        <Progress label={t('sheet.loading')} share={null} />
      </Screen>
    )
  }
  if (stored === null) {
    return (
      <Screen title={t('nav.sheet')} onBack={onBack} width="form">
        <EmptyState title={t('sheet.notHere')} text={t('sheet.notHereText')} />
      </Screen>
    )
  }
  return <SheetForm key={buildingId} buildingId={buildingId} stored={stored} onBack={onBack} />
}

interface SheetFormProps extends SheetScreenProps {
  readonly stored: StoredSheet
}

function SheetForm({ buildingId, stored, onBack }: SheetFormProps) {
  const { t, locale } = useMessages()
  const say = useToast()
  const form = useSheetForm(buildingId, stored)
  const [isCameraOpen, setIsCameraOpen] = useState(false)
  const isHere = useRef(true)
  useEffect(() => {
    isHere.current = true
    return () => {
      isHere.current = false
    }
  }, [])
  const { outline } = stored.building.building
  const label = buildingLabel(outline)
  const usable = useMemo(() => usableAnswers(form.answers), [form.answers])
  const sections = {
    answers: form.answers,
    unconfirmed: form.unconfirmed,
    faults: sectionFaults(form.unready, form.answers, t),
    answer: form.answer,
    confirm: form.confirm,
  }
  const stands = !form.answers.finding || form.answers.finding.kind === 'standing'
  const finish = async () => {
    const ending = await form.putInBag()
    if (ending === 'not-ready' || ending === 'not-kept') return
    if (ending === 'nothing-changed') say(t('sheet.nothingChanged'), 'attention')
    else say(t('sheet.putInBagDone', { label }), 'good')
    // who has walked on meanwhile is not called back
    if (isHere.current) onBack()
  }
  const subtitle = [
    t('sheet.subtitle', { reference: outline.reference, area: formatArea(outline.footprintM2, locale) }),
    ...(form.keeping.kind === 'keeping' ? [t('sheet.keeping')] : []),
    ...(form.keeping.at ? [t('sheet.kept', { time: formatDate(form.keeping.at, locale, 'time') })] : []),
  ].join(' · ')
  return (
    <Screen
      title={label}
      subtitle={subtitle}
      onBack={onBack}
      width="form"
      right={<Badge label={t('sheet.rev', { letter: revisionLetter(stored.nextRevision) })} tone="selection" />}
      footer={
        <>
          <IconButton icon="undo" framed label={t('sheet.undo')} disabled={!form.canUndo} onPress={form.undo} />
          <Button
            kind="secondary"
            grow
            label={t('sheet.photo', { count: stored.building.photoCount })}
            onPress={() => setIsCameraOpen(true)}
          />
          <Button kind="primary" grow label={t('sheet.putInBag')} onPress={() => void finish()} />
        </>
      }
      aside={<EstimatePanel answers={usable} />}
    >
      <SheetNotices stored={stored} keeping={form.keeping} unready={form.unready} />
      <SheetStart {...sections} buildingId={buildingId} onOffer={form.offer} />
      <WhereSection {...sections} />
      {stands ? (
        <>
          <WhatSection {...sections} />
          <BigSection {...sections} />
          <PartsSection {...sections} />
          <OldSection {...sections} />
          <MadeSection {...sections} />
          <ConditionSection {...sections} />
        </>
      ) : null}
      <PhotosSection sheetId={buildingId} isCameraOpen={isCameraOpen} onCamera={setIsCameraOpen} />
      <Panel title={t('sheet.sections.notes')}>
        <TextField
          label={t('sheet.notes')}
          hint={t('sheet.notesHint')}
          multiline
          lines={3}
          maxLength={4000}
          value={form.answers.notes?.text ?? ''}
          onChange={(text) => form.answer('notes', { text })}
        />
      </Panel>
      <SheetTitleBlock stored={stored} label={label} />
    </Screen>
  )
}

function SheetTitleBlock({ stored, label }: { readonly stored: StoredSheet; readonly label: string }) {
  const { t, locale } = useMessages()
  const { name } = useAccount()
  const { outline } = stored.building.building
  const when = stored.keptAt ?? stored.confirmed?.recordedAt
  return (
    <TitleBlock
      cells={[
        { label: t('common.titleBlock.number'), value: outline.reference },
        { label: t('common.titleBlock.place'), value: label, weight: 2 },
        { label: t('common.titleBlock.by'), value: stored.confirmed?.recordedByName ?? name },
        { label: t('common.titleBlock.date'), value: when ? formatDate(when, locale) : '–' },
        { label: t('common.titleBlock.revision'), value: revisionLetter(stored.nextRevision) },
      ]}
    />
  )
}
