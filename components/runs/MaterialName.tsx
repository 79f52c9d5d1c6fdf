import { StyleSheet, View } from 'react-native'
import { Swatch } from '@/components/charts/Swatch'
import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import { SPACE } from '@/components/ui/theme/tokens'
import type { Material } from '@/shared/compute/factors/vocabulary'

/** A material by its hatch and its name. */
export function MaterialName({ material }: { readonly material: Material }) {
  const { t } = useMessages()
  return (
    <View style={styles.row}>
      <Swatch material={material} />
      <View style={styles.name}>
        <AppText kind="number">{t(`vocabulary.material.${material}`)}</AppText>
      </View>
    </View>
  )
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', alignItems: 'center', gap: SPACE.small },
  name: { flexShrink: 1 },
})
