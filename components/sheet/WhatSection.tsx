import { KnownByPicker } from '@/components/ui/KnownByPicker'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Select } from '@/components/ui/Select'
import { USES } from '@/shared/compute/factors/vocabulary'
import type { SectionProps } from './form.types'

/** What the building is used for. */
export function WhatSection({ answers, offered, faults, answer }: SectionProps) {
  const { t } = useMessages()
  const use = answers.use
  return (
    <Panel title={t('sheet.sections.what')} note={offered.has('use') ? t('sheet.fromRegister') : undefined}>
      <Select
        label={t('sheet.use')}
        placeholder={t('sheet.usePlaceholder')}
        value={use?.use ?? null}
        error={faults.use}
        onChange={(value) => answer('use', value === 'unknown' ? { use: value } : { use: value, knownBy: 'seen' })}
        options={[...USES, 'unknown' as const].map((value) => ({ value, label: t(`vocabulary.use.${value}`) }))}
        aside={
          use && use.use !== 'unknown' ? (
            <KnownByPicker
              of={t('sheet.use')}
              value={use.knownBy ?? null}
              onChange={(knownBy) => answer('use', { ...use, knownBy })}
            />
          ) : undefined
        }
      />
    </Panel>
  )
}
