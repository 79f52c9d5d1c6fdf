import { Choice } from '@/components/ui/Choice'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Select } from '@/components/ui/Select'
import { formatShare } from '@/shared/format'
import { FACADES, ROOF_COVERS, ROOF_FORMS, type SheetAnswers } from '@/shared/schemas/sheet'
import type { SectionProps } from './form.types'
import { GroupKnownBy } from './GroupKnownBy'
import { UnconfirmedNote } from './UnconfirmedNote'

const OPENING_SHARES = ['0.1', '0.2', '0.3', '0.5', '0.8', 'unknown'] as const
type OpeningShare = (typeof OPENING_SHARES)[number]

/** Roof, façade and openings. */
export function ShellFields(props: SectionProps) {
  const { answers, faults, answer } = props
  const { t, locale } = useMessages()
  const { roof, facade, openings } = answers
  const setRoof = (part: Partial<NonNullable<SheetAnswers['roof']>>) =>
    answer('roof', { form: roof?.form ?? null, cover: roof?.cover ?? null, ...part, knownBy: 'seen' })
  return (
    <>
      <Select
        label={t('sheet.roofForm')}
        value={roof?.form ?? null}
        error={faults.roof}
        onChange={(form) => setRoof({ form })}
        options={ROOF_FORMS.map((value) => ({ value, label: t(`sheet.roofForms.${value}`) }))}
        aside={
          <GroupKnownBy of={t('sheet.roofForm')} answer={roof} isKnown onChange={(next) => answer('roof', next)} />
        }
      />
      <Select
        label={t('sheet.roofCover')}
        value={roof?.cover ?? null}
        onChange={(cover) => setRoof({ cover })}
        options={ROOF_COVERS.map((value) => ({ value, label: t(`sheet.roofCovers.${value}`) }))}
      />
      <UnconfirmedNote {...props} group="roof" />
      <Select
        label={t('sheet.facade')}
        value={facade?.facade ?? null}
        error={faults.facade}
        onChange={(value) => answer('facade', { facade: value, ...(value === 'unknown' ? {} : { knownBy: 'seen' }) })}
        options={FACADES.map((value) => ({ value, label: t(`sheet.facades.${value}`) }))}
        aside={
          <GroupKnownBy
            of={t('sheet.facade')}
            answer={facade}
            isKnown={facade?.facade !== 'unknown'}
            onChange={(next) => answer('facade', next)}
          />
        }
      />
      <UnconfirmedNote {...props} group="facade" />
      <Choice<OpeningShare>
        label={t('sheet.openings')}
        hint={t('sheet.openingsHint')}
        value={nearestShare(openings)}
        error={faults.openings}
        onChange={(share) =>
          answer(
            'openings',
            share === 'unknown' ? { openingsShare: null } : { openingsShare: Number(share), knownBy: 'guessed' },
          )
        }
        options={OPENING_SHARES.map((value) => ({
          value,
          label: value === 'unknown' ? t('common.notKnown') : formatShare(Number(value), locale),
        }))}
        aside={
          <GroupKnownBy
            of={t('sheet.openings')}
            answer={openings}
            isKnown={openings?.openingsShare !== null}
            onChange={(next) => answer('openings', next)}
          />
        }
      />
      <UnconfirmedNote {...props} group="openings" />
    </>
  )
}

function nearestShare(openings: SheetAnswers['openings']): OpeningShare | null {
  if (!openings) return null
  const share = openings.openingsShare
  if (share === null) return 'unknown'
  const near = OPENING_SHARES.filter((one) => one !== 'unknown')
  return near.reduce((best, one) => (Math.abs(Number(one) - share) < Math.abs(Number(best) - share) ? one : best))
}
