import { StyleSheet, View } from 'react-native'
import { AppText } from './AppText'
import { useMessages } from './MessagesProvider'
import { useTheme } from './theme/ThemeProvider'
import { RADIUS, SPACE } from './theme/tokens'

/** One cell of a title block. */
export interface TitleBlockCell {
  readonly label: string
  readonly value: string
  /** Share of the row's width against the others, 1 when left out. */
  readonly weight?: number
}

interface TitleBlockProps {
  /** Number, place, by, date, revision, edition: what this sheet, run or report has of them. */
  readonly cells: readonly TitleBlockCell[]
}

/** The block at the foot of every sheet, run and report that says which one it is. */
export function TitleBlock({ cells }: TitleBlockProps) {
  const { colours } = useTheme()
  const { t } = useMessages()
  return (
    <View role="group" aria-label={t('common.titleBlock.label')} style={[styles.block, { borderColor: colours.rule }]}>
      {cells.map(({ label, value, weight = 1 }) => (
        <View
          key={label}
          style={[styles.cell, { flexGrow: weight, borderColor: colours.rule, backgroundColor: colours.panel }]}
        >
          <AppText kind="label">{label}</AppText>
          <AppText kind="number" weight="medium">
            {value}
          </AppText>
        </View>
      ))}
    </View>
  )
}

const styles = StyleSheet.create({
  block: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    borderTopWidth: 1.5,
    borderLeftWidth: 1.5,
    borderRadius: RADIUS,
  },
  cell: {
    flexBasis: 'auto',
    minWidth: 72,
    borderRightWidth: 1.5,
    borderBottomWidth: 1.5,
    paddingHorizontal: SPACE.small,
    paddingVertical: SPACE.tight,
  },
})
