import { Pressable, ScrollView, StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { RADIUS, SPACE, TARGET } from '@/components/ui/theme/tokens'
import { plainFill } from './outlineFeatures'
import type { OutlineMapProps } from './OutlineMap.types'

/** The same outlines as a list: the map is drawn in the web app. */
export function OutlineMap({ label, outlines, paint, selectedIds = [], onPress, heightPx }: OutlineMapProps) {
  const { colours } = useTheme()
  const { t } = useMessages()
  return (
    <ScrollView aria-label={label} style={heightPx === undefined ? styles.fill : { height: heightPx }}>
      <AppText soft>{t('common.map.listFallback')}</AppText>
      {outlines.map(({ id, name }) => (
        <Pressable
          key={id}
          role="button"
          aria-pressed={selectedIds.includes(id)}
          onPress={() => onPress?.(id)}
          style={[styles.row, { borderColor: colours.hairline }]}
        >
          <View style={[styles.mark, { backgroundColor: plainFill(paint(id)), borderColor: colours.rule }]} />
          <AppText weight={selectedIds.includes(id) ? 'semibold' : 'regular'}>{name ?? id}</AppText>
        </Pressable>
      ))}
    </ScrollView>
  )
}

const styles = StyleSheet.create({
  fill: { flex: 1 },
  row: { minHeight: TARGET, flexDirection: 'row', alignItems: 'center', gap: SPACE.small, borderBottomWidth: 1 },
  mark: { width: 20, height: 20, borderWidth: 1, borderRadius: RADIUS },
})
