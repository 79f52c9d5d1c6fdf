import { useCallback, useMemo } from 'react'
import { MapLegend } from '@/components/map/MapLegend'
import { OutlineMap } from '@/components/map/OutlineMap'
import type { MapOutline, OutlinePaint } from '@/components/map/OutlineMap.types'
import { quantileBreaks, rampColour } from '@/components/map/ramp'
import { useMessages } from '@/components/ui/MessagesProvider'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import type { Material } from '@/shared/compute/factors/vocabulary'
import { formatCount, formatRange } from '@/shared/format'
import type { RunBuilding } from '@/shared/schemas/run'
import { buildingMeasure, formatMeasure, type Measure } from './buildingMeasure'
import { legendSteps } from './legendSteps'

interface DistrictMapProps {
  readonly districtName: string
  readonly outlines: readonly MapOutline[]
  readonly buildings: readonly RunBuilding[]
  readonly measure: Measure
  readonly material: Material | 'all'
  readonly selectedOutlineId: string | null
  readonly onPress: (outlineId: string) => void
  /** Fills its place when left out. */
  readonly heightPx?: number
}

/** The outlines of a district, each painted by a figure of its building; what is not computed stays pale. */
export function DistrictMap(props: DistrictMapProps) {
  const { districtName, outlines, buildings, measure, material, selectedOutlineId, onPress } = props
  const messages = useMessages()
  const { t, locale } = messages
  const { colours } = useTheme()
  const values = useMemo(() => {
    const found = new Map<string, number>()
    for (const building of buildings) {
      const value = buildingMeasure(building, measure, material)
      if (building.outlineId !== null && value !== null && Number.isFinite(value)) found.set(building.outlineId, value)
    }
    return found
  }, [buildings, measure, material])
  const breaks = useMemo(() => quantileBreaks([...values.values()]), [values])
  const paint = useCallback(
    (id: string): OutlinePaint => {
      const value = values.get(id)
      return value === undefined ? { fill: colours.panel, opacity: 0.6 } : { fill: rampColour(value, breaks) }
    },
    [values, breaks, colours],
  )
  const selectedIds = useMemo(() => (selectedOutlineId === null ? [] : [selectedOutlineId]), [selectedOutlineId])
  const restCount = outlines.filter(({ id }) => !values.has(id)).length
  const write = (value: number): string => formatMeasure(value, measure, messages)
  const steps = legendSteps([...values.values()], breaks)
  const isMass = measure === 'perFootprint' || measure === 'standing' || measure === 'expectedTenYears'
  const measureText = t(`district.measures.${measure}`)
  return (
    <OutlineMap
      label={t('district.mapLabel', { district: districtName, measure: measureText })}
      outlines={outlines}
      paint={paint}
      selectedIds={selectedIds}
      onPress={onPress}
      heightPx={props.heightPx}
      fitKey={outlines.length === 0 ? 'none' : districtName}
      overlay={
        <MapLegend
          title={
            isMass
              ? t('district.legendTitle', {
                  measure: measureText,
                  material: material === 'all' ? t('district.allMaterials') : t(`vocabulary.material.${material}`),
                })
              : measureText
          }
          entries={[
            ...steps.map(({ low, high, count }) => ({
              key: String(low),
              label: t('district.legendEntry', {
                range: formatRange(low, high, write),
                count: formatCount(count, locale),
              }),
              colour: rampColour(low, breaks),
            })),
            ...(restCount === 0
              ? []
              : [
                  {
                    key: 'rest',
                    label: t('district.notComputed', { count: restCount }),
                    colour: colours.panel,
                  },
                ]),
          ]}
          note={t('district.legendNote')}
        />
      }
    />
  )
}
