import { Fragment, type ReactNode } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import { SPACE } from '@/components/ui/theme/tokens'

/** One line of a legend. */
export interface LegendEntry {
  readonly key: string
  readonly label: string
  /** A `Swatch`, or a line as the chart draws it. */
  readonly mark: ReactNode
  /** Figure beside it: "58 %". */
  readonly value?: string
}

interface LegendProps {
  readonly entries: readonly LegendEntry[]
  /** Name of the list; "Legend" when left out. */
  readonly label?: string
}

/** What the marks of a drawing mean. */
export function Legend({ entries, label }: LegendProps) {
  const { t } = useMessages()
  return (
    <View role="list" aria-label={label ?? t('common.charts.legend')} style={styles.list}>
      {entries.map((entry) => (
        <View key={entry.key} role="listitem" style={styles.entry}>
          <Fragment>{entry.mark}</Fragment>
          <AppText>{entry.label}</AppText>
          {entry.value ? (
            <AppText kind="number" soft>
              {entry.value}
            </AppText>
          ) : null}
        </View>
      ))}
    </View>
  )
}

const styles = StyleSheet.create({
  list: { flexDirection: 'row', flexWrap: 'wrap', columnGap: SPACE.large, rowGap: SPACE.tight },
  entry: { flexDirection: 'row', alignItems: 'center', gap: SPACE.small - 2 },
})
