import { useCallback, useEffect, useMemo, useRef, useState } from 'react'
import { Badge } from '@/components/ui/Badge'
import { Button } from '@/components/ui/Button'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
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
import { sectionFaults } from './sectionFaults'
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
    offered: form.offered,
    faults: sectionFaults(form.unready, form.answers, t),
    answer: form.answer,
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
      <SheetNotices stored={stored} form={form} />
      <WhereSection {...sections} />
      {stands ? (
        <>
          <WhatSection {...sections} />
          <BigSection {...sections} answers={usableForArea(form.answers, usable)} />
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

/** The area is drawn from what holds; the fields show what is typed. */
function usableForArea<Answers extends object>(typed: Answers, usable: Answers): Answers {
  return { ...typed, ...usable }
}

interface SheetNoticesProps {
  readonly stored: StoredSheet
  readonly form: ReturnType<typeof useSheetForm>
}

function SheetNotices({ stored, form }: SheetNoticesProps) {
  const { t } = useMessages()
  const { question } = stored.building
  const open = stored.conflicts.filter(({ state }) => state === 'open').length
  return (
    <>
      {question ? (
        <Notice tone="error" whatHappened={`${t('sheet.question')}: ${t('today.question', { question })}`} />
      ) : null}
      {open > 0 ? <Notice tone="attention" whatHappened={t('sheet.conflicts', { count: open })} /> : null}
      {form.keeping.kind === 'failed' ? (
        <Notice
          tone="error"
          urgent
          whatHappened={t('sheet.notKept', { reason: form.keeping.reason ?? '' })}
          whatIsSafe={t('sheet.notKeptSafe')}
          whatToDo={t('sheet.notKeptToDo')}
        />
      ) : null}
      {form.unready.length > 0 ? (
        <Notice
          tone="attention"
          urgent
          whatHappened={t('sheet.missing', {
            groups: form.unready.map((group) => t(`sheet.group.${group}`)).join(', '),
          })}
        />
      ) : null}
    </>
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
