import { Swatch } from '@/components/charts/Swatch'
import { Choice } from '@/components/ui/Choice'
import { KnownByPicker } from '@/components/ui/KnownByPicker'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { STRUCTURES, type Material, type Structure } from '@/shared/compute/factors/vocabulary'
import type { SectionProps } from './form.types'

const HATCH_OF: Readonly<Record<Structure, Material>> = {
  'reinforced-concrete': 'concrete',
  'precast-panel': 'concrete',
  'masonry-timber-floors': 'masonry-units',
  'masonry-concrete-floors': 'masonry-units',
  'timber-frame': 'timber',
  'mass-timber': 'timber',
  'steel-frame': 'steel',
  hybrid: 'other',
  earth: 'mortar-plaster',
}

/** What carries the building. */
export function MadeSection({ answers, faults, answer }: SectionProps) {
  const { t } = useMessages()
  const structure = answers.structure
  return (
    <Panel title={t('sheet.sections.made')} note={t('sheet.structureNote')}>
      <Choice
        label={t('sheet.structure')}
        value={structure?.structure ?? null}
        error={faults.structure}
        onChange={(value) =>
          answer('structure', value === 'unknown' ? { structure: value } : { structure: value, knownBy: 'seen' })
        }
        options={[...STRUCTURES, 'unknown' as const].map((value) => ({
          value,
          label: t(`vocabulary.structure.${value}`),
          ...(value === 'unknown' ? {} : { swatch: <Swatch material={HATCH_OF[value]} size={22} /> }),
        }))}
        aside={
          structure && structure.structure !== 'unknown' ? (
            <KnownByPicker
              of={t('sheet.structure')}
              value={structure.knownBy ?? null}
              onChange={(knownBy) => answer('structure', { ...structure, knownBy })}
            />
          ) : undefined
        }
      />
    </Panel>
  )
}
