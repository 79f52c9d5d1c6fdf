import { Swatch } from '@/components/charts/Swatch'
import { Choice } from '@/components/ui/Choice'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { STRUCTURES, type Material, type Structure } from '@/shared/compute/factors/vocabulary'
import type { SectionProps } from './form.types'
import { Further } from './Further'
import { GroupKnownBy } from './GroupKnownBy'
import { ShellFields } from './ShellFields'
import { UnconfirmedNote } from './UnconfirmedNote'

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

/** What carries the building, and what covers it. */
export function MadeSection(props: SectionProps) {
  const { answers, faults, answer } = props
  const { t } = useMessages()
  const { structure, roof, facade, openings } = answers
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
          <GroupKnownBy
            of={t('sheet.structure')}
            answer={structure}
            isKnown={structure?.structure !== 'unknown'}
            onChange={(next) => answer('structure', next)}
          />
        }
      />
      <UnconfirmedNote {...props} group="structure" />
      <Further label={t('sheet.shell')} isOpenAtFirst={Boolean(roof ?? facade ?? openings)}>
        <ShellFields {...props} />
      </Further>
    </Panel>
  )
}
