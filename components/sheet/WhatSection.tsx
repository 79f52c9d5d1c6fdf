import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Select } from '@/components/ui/Select'
import { USES } from '@/shared/compute/factors/vocabulary'
import type { SectionProps } from './form.types'
import { GroupKnownBy } from './GroupKnownBy'
import { OtherUses } from './OtherUses'
import { UnconfirmedNote } from './UnconfirmedNote'

/** What the building is used for: mainly, and else. */
export function WhatSection(props: SectionProps) {
  const { answers, faults, answer } = props
  const { t } = useMessages()
  const use = answers.use
  return (
    <Panel title={t('sheet.sections.what')}>
      <Select
        label={t('sheet.use')}
        placeholder={t('sheet.usePlaceholder')}
        value={use?.use ?? null}
        error={faults.use}
        onChange={(value) =>
          answer('use', {
            use: value,
            ...(use?.otherUses ? { otherUses: use.otherUses } : {}),
            ...(value === 'unknown' ? {} : { knownBy: 'seen' as const }),
          })
        }
        options={[...USES, 'unknown' as const].map((value) => ({ value, label: t(`vocabulary.use.${value}`) }))}
        aside={
          <GroupKnownBy
            of={t('sheet.use')}
            answer={use}
            isKnown={use?.use !== 'unknown'}
            onChange={(next) => answer('use', next)}
          />
        }
      />
      <UnconfirmedNote {...props} group="use" />
      {use ? <OtherUses use={use} onChange={(next) => answer('use', next)} /> : null}
    </Panel>
  )
}
