import { StyleSheet, View } from 'react-native'
import { useMessages } from '@/components/ui/MessagesProvider'
import { NumberField } from '@/components/ui/NumberField'
import { SPACE } from '@/components/ui/theme/tokens'
import type { ConstructionYear } from '@/shared/schemas/sheet'

interface PartYearsProps {
  readonly number: number
  readonly year: ConstructionYear
  readonly onChange: (year: ConstructionYear) => void
}

/** First and last possible year of a part; both empty is not known, one alone is exact. */
export function PartYears({ number, year, onChange }: PartYearsProps) {
  const { t } = useMessages()
  const { from, to } = typedYears(year)
  return (
    <View style={styles.row}>
      <View style={styles.half}>
        <NumberField
          label={t('sheet.parts.from', { number })}
          hint={t('sheet.parts.fromHint')}
          whole
          grouping={false}
          value={from}
          onChange={(next) => onChange(yearOf(next, to))}
        />
      </View>
      <View style={styles.half}>
        <NumberField
          label={t('sheet.parts.to', { number })}
          whole
          grouping={false}
          value={to}
          onChange={(next) => onChange(yearOf(from, next))}
        />
      </View>
    </View>
  )
}

function typedYears(year: ConstructionYear): { from: number | null; to: number | null } {
  if (year.kind === 'unknown') return { from: null, to: null }
  if (year.kind === 'exact') return { from: year.year, to: null }
  return { from: year.fromYear || null, to: year.toYear || null }
}

function yearOf(from: number | null, to: number | null): ConstructionYear {
  if (from === null && to === null) return { kind: 'unknown' }
  if (to === null) return { kind: 'exact', year: from ?? 0, knownBy: 'guessed' }
  return { kind: 'between', fromYear: from ?? 0, toYear: to, knownBy: 'guessed' }
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', alignItems: 'flex-start', gap: SPACE.small },
  half: { flex: 1, minWidth: 0 },
})
