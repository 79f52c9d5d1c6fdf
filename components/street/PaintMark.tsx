import { StyleSheet, View } from 'react-native'
import { Swatch } from '@/components/charts/Swatch'
import type { OutlinePaint } from '@/components/map/OutlineMap.types'

/** A small outline as the map paints it, for the legend. */
export function PaintMark({ paint }: { readonly paint: OutlinePaint }) {
  const { fill, hatch, outline, opacity = 1, outlinePx = 1 } = paint
  if (hatch) return <Swatch material={hatch} size={18} />
  return (
    <View style={[styles.edge, { borderColor: outline, borderWidth: outlinePx }]}>
      <View style={[styles.ground, { backgroundColor: fill, opacity }]} />
    </View>
  )
}

const styles = StyleSheet.create({ edge: { width: 22, height: 16 }, ground: { flex: 1 } })
