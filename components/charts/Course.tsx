import { useId } from 'react'
import { Line, Rect } from 'react-native-svg'
import type { Material } from '@/shared/compute/factors/vocabulary'
import { useMessages } from '@/components/ui/MessagesProvider'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { formatShare } from '@/shared/format'
import { bondJoints } from './bondJoints'
import { ChartFrame } from './ChartFrame'
import { courseStretches } from './courseStretches'
import { HatchDefs, hatchFill } from './hatches'

/** A material of a composition. */
export interface CoursePart {
  readonly material: Material
  readonly massKg: number
}

interface CourseProps {
  /** In the order in which they are laid, from the left; heaviest first reads best. */
  readonly parts: readonly CoursePart[]
  /** Rows of stones, 3 when left out; 2 on a sheet, 1 in a list. */
  readonly rows?: number
  /** Height of a row [px]; 18 when left out. */
  readonly rowPx?: number
  /** What it is the composition of; read before the shares. */
  readonly of?: string
  /** Draws the stones paler, for what is only guessed. */
  readonly faint?: boolean
}

const LEAST_STONE_PX = 7
const JOINT_PX = 2

/** The signature of the product: a composition laid like masonry, each stone a material, its width by mass. */
export function Course({ parts, rows = 3, rowPx = 18, of, faint = false }: CourseProps) {
  const { colours } = useTheme()
  const { t, locale } = useMessages()
  const prefix = useId()
  const totalKg = parts.reduce((sum, { massKg }) => sum + Math.max(0, massKg || 0), 0)
  const heightPx = rows * rowPx + JOINT_PX * (rows - 1) + 3
  const spoken = parts
    .filter(({ massKg }) => massKg > 0)
    .map(({ material, massKg }) =>
      t('common.charts.coursePart', {
        name: t(`vocabulary.material.${material}`),
        share: formatShare(massKg / totalKg, locale),
      }),
    )
    .join(', ')
  const label = totalKg > 0 ? t('common.charts.course', { parts: spoken }) : t('common.charts.empty')
  return (
    <ChartFrame label={of ? `${of}. ${label}` : label} heightPx={heightPx}>
      {(widthPx) => {
        const innerPx = widthPx - 3
        const stretches = courseStretches(
          parts.map(({ massKg }) => massKg),
          innerPx,
          LEAST_STONE_PX,
        )
        const stonePx = rowPx * 2.6
        return (
          <>
            <HatchDefs
              prefix={prefix}
              materials={parts.map(({ material }) => material)}
              scale={rowPx < 16 ? 'calm' : 'full'}
            />
            <Rect x={0.75} y={0.75} width={widthPx - 1.5} height={heightPx - 1.5} fill={colours.sunken} />
            {stretches.map(({ part, fromPx, toPx }) => {
              const material = parts[part]?.material
              return material ? (
                <Rect
                  key={material}
                  x={1.5 + fromPx}
                  y={1.5}
                  width={toPx - fromPx}
                  height={heightPx - 3}
                  fill={hatchFill(prefix, material)}
                  opacity={faint ? 0.45 : 1}
                />
              ) : null
            })}
            {stretches.slice(1).map(({ fromPx }) => (
              <Joint key={fromPx} x={1.5 + fromPx} fromPx={1.5} toPx={heightPx - 1.5} />
            ))}
            {Array.from({ length: rows }, (_, row) => {
              const topPx = 1.5 + row * (rowPx + JOINT_PX)
              return bondJoints(stretches, row, stonePx).map((at) => (
                <Joint key={`${row} ${at}`} x={1.5 + at} fromPx={topPx} toPx={topPx + rowPx} />
              ))
            })}
            {Array.from({ length: rows - 1 }, (_, row) => {
              const y = 1.5 + (row + 1) * (rowPx + JOINT_PX) - JOINT_PX / 2
              return <Line key={row} x1={1.5} x2={widthPx - 1.5} y1={y} y2={y} stroke={MORTAR} strokeWidth={JOINT_PX} />
            })}
            <Rect
              x={0.75}
              y={0.75}
              width={widthPx - 1.5}
              height={heightPx - 1.5}
              fill="none"
              stroke={colours.rule}
              strokeWidth={1.5}
              strokeDasharray={totalKg > 0 ? undefined : '5 4'}
            />
          </>
        )
      }}
    </ChartFrame>
  )
}

/** Joints are paper in every theme: the stones keep their own grounds as well. */
const MORTAR = '#FDFBF6'

function Joint({ x, fromPx, toPx }: { readonly x: number; readonly fromPx: number; readonly toPx: number }) {
  return <Line x1={x} x2={x} y1={fromPx} y2={toPx} stroke={MORTAR} strokeWidth={JOINT_PX} />
}
