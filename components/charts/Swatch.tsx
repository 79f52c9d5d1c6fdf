import { useId } from 'react'
import Svg, { Rect } from 'react-native-svg'
import type { Material } from '@/shared/compute/factors/vocabulary'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { HatchDefs, hatchFill } from './hatches'

interface SwatchProps {
  readonly material: Material
  /** Edge [px]; 22 when left out. */
  readonly size?: number
}

/** A square of a material's hatch beside its name; screen readers pass it over. */
export function Swatch({ material, size = 22 }: SwatchProps) {
  const { colours } = useTheme()
  const prefix = useId()
  return (
    <Svg width={size} height={size} viewBox={`0 0 ${size} ${size}`} aria-hidden>
      <HatchDefs prefix={prefix} materials={[material]} scale={size < 40 ? 'calm' : 'full'} />
      <Rect
        x={0.5}
        y={0.5}
        width={size - 1}
        height={size - 1}
        fill={hatchFill(prefix, material)}
        stroke={colours.rule}
        strokeWidth={1}
      />
    </Svg>
  )
}
