import { StyleSheet, View } from 'react-native'
import { Choice } from '@/components/ui/Choice'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Select } from '@/components/ui/Select'
import { SPACE } from '@/components/ui/theme/tokens'
import { MATERIALS, type Material } from '@/shared/compute/factors/vocabulary'
import { MEASURES, type Measure } from './buildingMeasure'

/** What is shown of a district, and how. */
export interface DistrictView {
  readonly measure: Measure
  readonly material: Material | 'all'
  readonly shape: 'map' | 'table'
}

interface DistrictControlsProps {
  readonly view: DistrictView
  readonly onChange: (view: DistrictView) => void
}

/** Measure, material, and map or table. */
export function DistrictControls({ view, onChange }: DistrictControlsProps) {
  const { t } = useMessages()
  const isChance = view.measure === 'chanceTenYears' || view.measure === 'chanceThirtyYears'
  return (
    <View style={styles.row}>
      <View style={styles.field}>
        <Select
          label={t('district.measure')}
          options={MEASURES.map((value) => ({ value, label: t(`district.measures.${value}`) }))}
          value={view.measure}
          onChange={(measure) => onChange({ ...view, measure })}
        />
      </View>
      <View style={styles.field}>
        <Select<Material | 'all'>
          label={t('district.material')}
          options={[
            { value: 'all' as const, label: t('district.allMaterials') },
            ...MATERIALS.map((value) => ({ value, label: t(`vocabulary.material.${value}`) })),
          ]}
          value={view.material}
          disabled={isChance}
          onChange={(material) => onChange({ ...view, material })}
        />
      </View>
      <Choice
        label={t('district.view')}
        options={(['map', 'table'] as const).map((value) => ({ value, label: t(`district.${value}`) }))}
        value={view.shape}
        onChange={(shape) => onChange({ ...view, shape })}
      />
    </View>
  )
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.medium, alignItems: 'flex-end' },
  field: { flexGrow: 1, flexBasis: 150, maxWidth: 320 },
})
