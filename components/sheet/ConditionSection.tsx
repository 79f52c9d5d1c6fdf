import { Choice } from '@/components/ui/Choice'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { TextField } from '@/components/ui/TextField'
import { CONDITIONS, PERMIT_NOTICES, VACANCIES } from '@/shared/schemas/sheet'
import type { SectionProps } from './form.types'
import { Further } from './Further'
import { GroupKnownBy } from './GroupKnownBy'
import { Suspicions } from './Suspicions'
import { UnconfirmedNote } from './UnconfirmedNote'

/** A first look at the state of the building, and what is to be suspected at its age. */
export function ConditionSection(props: SectionProps) {
  const { answers, answer } = props
  const { t } = useMessages()
  const { condition, vacancy, protection, permitNotice } = answers
  return (
    <Panel title={t('sheet.sections.condition')}>
      <Choice
        label={t('sheet.condition')}
        hint={t('cautions.condition')}
        value={condition?.condition ?? null}
        onChange={(value) => answer('condition', { condition: value, ...seenIf(value !== 'unknown') })}
        options={CONDITIONS.map((value) => ({ value, label: t(`vocabulary.condition.${value}`) }))}
        aside={
          <GroupKnownBy
            of={t('sheet.condition')}
            answer={condition}
            isKnown={condition?.condition !== 'unknown'}
            onChange={(next) => answer('condition', next)}
          />
        }
      />
      <UnconfirmedNote {...props} group="condition" />
      <Choice
        label={t('sheet.vacancy')}
        value={vacancy?.vacancy ?? null}
        onChange={(value) => answer('vacancy', { vacancy: value, ...seenIf(value !== 'unknown') })}
        options={VACANCIES.map((value) => ({ value, label: t(`vocabulary.vacancy.${value}`) }))}
        aside={
          <GroupKnownBy
            of={t('sheet.vacancy')}
            answer={vacancy}
            isKnown={vacancy?.vacancy !== 'unknown'}
            onChange={(next) => answer('vacancy', next)}
          />
        }
      />
      <Choice<'yes' | 'no'>
        label={t('sheet.protected')}
        value={protection ? (protection.isProtected ? 'yes' : 'no') : null}
        onChange={(value) => answer('protection', { isProtected: value === 'yes', knownBy: 'told' })}
        options={(['yes', 'no'] as const).map((value) => ({ value, label: t(`common.${value}`) }))}
        aside={
          <GroupKnownBy
            of={t('sheet.protected')}
            answer={protection}
            isKnown
            onChange={(next) => answer('protection', next)}
          />
        }
      />
      <Further label={t('sheet.permit')} isOpenAtFirst={permitNotice !== undefined}>
        <PermitFields {...props} />
      </Further>
      <Suspicions {...props} />
    </Panel>
  )
}

function PermitFields({ answers, answer }: SectionProps) {
  const { t } = useMessages()
  const permit = answers.permitNotice
  const names = permit?.notice !== undefined && permit.notice !== 'none' && permit.notice !== 'unknown'
  return (
    <>
      <Choice
        label={t('sheet.permitNotice')}
        value={permit?.notice ?? null}
        onChange={(notice) =>
          answer('permitNotice', { notice, reference: permit?.reference ?? '', ...seenIf(notice !== 'unknown') })
        }
        options={PERMIT_NOTICES.map((value) => ({ value, label: t(`sheet.permitNotices.${value}`) }))}
        aside={
          <GroupKnownBy
            of={t('sheet.permitNotice')}
            answer={permit}
            isKnown={permit?.notice !== 'unknown'}
            onChange={(next) => answer('permitNotice', next)}
          />
        }
      />
      {permit && names ? (
        <TextField
          label={t('sheet.permitReference')}
          hint={t('sheet.permitReferenceHint')}
          maxLength={120}
          value={permit.reference}
          onChange={(reference) => answer('permitNotice', { ...permit, reference })}
        />
      ) : null}
    </>
  )
}

function seenIf(isKnown: boolean): { knownBy?: 'seen' } {
  return isKnown ? { knownBy: 'seen' } : {}
}
