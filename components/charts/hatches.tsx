import { G, Path, Pattern, Rect } from 'react-native-svg'
import type { Material } from '@/shared/compute/factors/vocabulary'
import type { Hatch } from '@/shared/hatches/hatch.types'
import { MATERIAL_HATCHES } from '@/shared/hatches/materialHatches'
import { SvgDefs } from './SvgDefs'

/** How finely a hatch is drawn: `full` on bars and stones, `calm` where there is little room. */
export type HatchScale = 'full' | 'calm'

interface HatchDefsProps {
  /** Makes the names of the patterns unique on the page: a `useId()`. */
  readonly prefix: string
  readonly materials: readonly Material[]
  readonly scale?: HatchScale
}

/** The patterns that a drawing's `fill={hatchFill(prefix, material)}` refers to. Stands once in each `Svg`. */
export function HatchDefs({ prefix, materials, scale = 'full' }: HatchDefsProps) {
  return (
    <SvgDefs>
      {[...new Set(materials)].map((material) => (
        <HatchPattern
          key={material}
          id={patternName(prefix, material)}
          hatch={MATERIAL_HATCHES[material]}
          scale={scale}
        />
      ))}
    </SvgDefs>
  )
}

/** Fill of a shape that shows a material. */
export function hatchFill(prefix: string, material: Material): string {
  return `url(#${patternName(prefix, material)})`
}

function patternName(prefix: string, material: Material): string {
  return `hatch-${prefix.replace(/[^\w-]/g, '')}-${material}`
}

interface HatchPatternProps {
  readonly id: string
  readonly hatch: Hatch
  readonly scale: HatchScale
}

function HatchPattern({ id, hatch, scale }: HatchPatternProps) {
  const { widthPx, heightPx, strokes, fills } = hatch[scale]
  return (
    <Pattern id={id} patternUnits="userSpaceOnUse" width={widthPx} height={heightPx}>
      <Rect width={widthPx} height={heightPx} fill={hatch.ground} />
      <G>
        {strokes.map((stroke) => (
          <Path key={stroke.d} d={stroke.d} stroke={hatch.ink} strokeWidth={stroke.widthPx} fill="none" />
        ))}
        {fills.map((d) => (
          <Path key={d} d={d} fill={hatch.ink} />
        ))}
      </G>
    </Pattern>
  )
}
