import { StyleSheet, View } from 'react-native'
import { Choice } from '@/components/ui/Choice'
import { KnownByPicker } from '@/components/ui/KnownByPicker'
import { useMessages } from '@/components/ui/MessagesProvider'
import { NumberField } from '@/components/ui/NumberField'
import { Panel } from '@/components/ui/Panel'
import { SPACE } from '@/components/ui/theme/tokens'
import type { ConstructionYear } from '@/shared/schemas/sheet'
import type { SectionProps } from './form.types'
import { Further } from './Further'
import { Refurbishments } from './Refurbishments'
import { UnconfirmedNote } from './UnconfirmedNote'

const KINDS = ['exact', 'between', 'unknown'] as const
type Kind = (typeof KINDS)[number]

/** The construction year: exact, between two years, or not known; and what was renewed since. */
export function OldSection(props: SectionProps) {
  const { answers, faults, answer } = props
  const { t } = useMessages()
  const year = answers.constructionYear
  const setYear = (next: ConstructionYear) => answer('constructionYear', next)
  const typed = year && year.kind !== 'unknown' && year.knownBy === 'register' ? ({ knownBy: 'guessed' } as const) : {}
  const field = (label: string, value: number, onYear: (year: number) => void) => (
    <View style={styles.half}>
      <NumberField
        label={label}
        whole
        grouping={false}
        value={value > 0 ? value : null}
        onChange={(entered) => onYear(entered ?? 0)}
      />
    </View>
  )
  return (
    <Panel title={t('sheet.sections.old')}>
      <Choice<Kind>
        label={t('sheet.year')}
        value={year?.kind ?? null}
        error={faults.constructionYear}
        onChange={(kind) => setYear(ofKind(kind, year))}
        options={KINDS.map((value) => ({ value, label: t(`sheet.yearKind.${value}`) }))}
        aside={
          year && year.kind !== 'unknown' ? (
            <KnownByPicker
              of={t('sheet.year')}
              value={year.knownBy}
              onChange={(knownBy) => setYear({ ...year, knownBy })}
            />
          ) : undefined
        }
      />
      <View style={styles.row}>
        {year?.kind === 'exact'
          ? field(t('sheet.yearExact'), year.year, (exact) => setYear({ ...year, ...typed, year: exact }))
          : null}
        {year?.kind === 'between' ? (
          <>
            {field(t('sheet.yearFrom'), year.fromYear, (fromYear) => setYear({ ...year, ...typed, fromYear }))}
            {field(t('sheet.yearTo'), year.toYear, (toYear) => setYear({ ...year, ...typed, toYear }))}
          </>
        ) : null}
      </View>
      <UnconfirmedNote {...props} group="constructionYear" />
      <Further label={t('sheet.renewed')} isOpenAtFirst={(answers.refurbishments?.done.length ?? 0) > 0}>
        <Refurbishments {...props} />
      </Further>
    </Panel>
  )
}

/** The other kind, with the years that were typed already; 0 stands for one that is not typed yet. */
function ofKind(kind: Kind, before: ConstructionYear | undefined): ConstructionYear {
  if (kind === 'unknown') return { kind }
  const knownBy = before && before.kind !== 'unknown' ? before.knownBy : 'guessed'
  const from = before?.kind === 'exact' ? before.year : before?.kind === 'between' ? before.fromYear : 0
  if (kind === 'exact') return { kind, year: from, knownBy }
  return { kind, fromYear: from, toYear: before?.kind === 'between' ? before.toYear : from, knownBy }
}

const styles = StyleSheet.create({ row: { flexDirection: 'row', gap: SPACE.medium }, half: { flex: 1 } })
