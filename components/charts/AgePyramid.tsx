import { G, Line, Rect } from 'react-native-svg'
import { useMessages } from '@/components/ui/MessagesProvider'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { labelWidthPx } from './Axis'
import { ChartFrame } from './ChartFrame'
import { SvgLabel } from './SvgLabel'

/** A cohort of the pyramid. */
export interface PyramidRow {
  readonly key: string
  /** Name of the period: "1961–1975". */
  readonly label: string
  /** To the left: buildings, say. */
  readonly left: number
  /** To the right: mass or floor area. */
  readonly right: number
}

interface AgePyramidProps {
  readonly title: string
  /** Oldest first; the oldest stands at the foot. */
  readonly rows: readonly PyramidRow[]
  readonly leftHead: string
  readonly rightHead: string
  readonly formatLeft: (value: number) => string
  readonly formatRight: (value: number) => string
  /** Height of a row [px]; 30 when left out. */
  readonly rowPx?: number
}

const HEAD_PX = 24

/** Stock by age: one measure to the left, one to the right of each construction period, each to its own scale. */
export function AgePyramid(props: AgePyramidProps) {
  const { title, rows, leftHead, rightHead, formatLeft, formatRight, rowPx = 30 } = props
  const { t } = useMessages()
  const { colours } = useTheme()
  const largest = [...rows].sort((one, other) => other.right - one.right)[0]
  const label = largest
    ? t('common.charts.agePyramid', { title, period: largest.label, value: formatRight(largest.right) })
    : `${title}. ${t('common.charts.empty')}`
  const heightPx = HEAD_PX + rows.length * rowPx + 2
  return (
    <ChartFrame label={label} heightPx={heightPx}>
      {(widthPx) => {
        const namePx = Math.max(64, ...rows.map((row) => labelWidthPx(row.label) + 12))
        const barRoomPx = (widthPx - namePx) / 2
        const valuePx = Math.min(barRoomPx * 0.5, 72)
        const scaleOf = (values: readonly number[]) => {
          const most = Math.max(...values, 0)
          return (value: number): number => (most > 0 ? (Math.max(0, value) / most) * (barRoomPx - valuePx) : 0)
        }
        const leftPx = scaleOf(rows.map(({ left }) => left))
        const rightPx = scaleOf(rows.map(({ right }) => right))
        return (
          <G>
            <SvgLabel x={barRoomPx - 6} y={14} anchor="end" weight="semibold">
              {leftHead}
            </SvgLabel>
            <SvgLabel x={barRoomPx + namePx + 6} y={14} weight="semibold">
              {rightHead}
            </SvgLabel>
            {[...rows].reverse().map((row, place) => {
              const y = HEAD_PX + place * rowPx
              const textY = y + rowPx / 2 + 4
              return (
                <G key={row.key}>
                  <Rect
                    x={barRoomPx - leftPx(row.left)}
                    y={y + 3}
                    width={leftPx(row.left)}
                    height={rowPx - 6}
                    fill={colours.selection}
                  />
                  <Rect
                    x={barRoomPx + namePx}
                    y={y + 3}
                    width={rightPx(row.right)}
                    height={rowPx - 6}
                    fill={colours.action}
                  />
                  <SvgLabel x={barRoomPx - leftPx(row.left) - 5} y={textY} anchor="end" colour={colours.ink}>
                    {formatLeft(row.left)}
                  </SvgLabel>
                  <SvgLabel x={barRoomPx + namePx + rightPx(row.right) + 5} y={textY} colour={colours.ink}>
                    {formatRight(row.right)}
                  </SvgLabel>
                  <SvgLabel x={barRoomPx + namePx / 2} y={textY} anchor="middle" weight="medium" colour={colours.ink}>
                    {row.label}
                  </SvgLabel>
                </G>
              )
            })}
            {[barRoomPx, barRoomPx + namePx].map((x) => (
              <Line key={x} x1={x} x2={x} y1={HEAD_PX} y2={heightPx - 2} stroke={colours.rule} strokeWidth={1.5} />
            ))}
          </G>
        )
      }}
    </ChartFrame>
  )
}
