import { G, Line } from 'react-native-svg'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { SvgLabel } from './SvgLabel'

/** A place on an axis and what stands there. */
export interface Tick {
  readonly atPx: number
  readonly label: string
}

interface XAxisProps {
  readonly ticks: readonly Tick[]
  readonly fromPx: number
  readonly toPx: number
  /** Height of the axis in the drawing [px]. */
  readonly yPx: number
}

/** The ground line of a chart with its labels; those that would run into their neighbour are left out. */
export function XAxis({ ticks, fromPx, toPx, yPx }: XAxisProps) {
  const { colours } = useTheme()
  return (
    <G>
      <Line x1={fromPx} x2={toPx} y1={yPx} y2={yPx} stroke={colours.rule} strokeWidth={1.5} />
      {roomyTicks(ticks).map(({ atPx, label }) => (
        <G key={`${atPx} ${label}`}>
          <Line x1={atPx} x2={atPx} y1={yPx} y2={yPx + 4} stroke={colours.rule} strokeWidth={1} />
          <SvgLabel x={atPx} y={yPx + 18} anchor={anchorOf(atPx, label, fromPx, toPx)}>
            {label}
          </SvgLabel>
        </G>
      ))}
    </G>
  )
}

interface YAxisProps {
  readonly ticks: readonly Tick[]
  /** Left end of the grid lines [px]; labels stand before it. */
  readonly fromPx: number
  readonly toPx: number
}

/** Hairlines across a chart with their values before them. */
export function YAxis({ ticks, fromPx, toPx }: YAxisProps) {
  const { colours } = useTheme()
  return (
    <G>
      {ticks.map(({ atPx, label }) => (
        <G key={`${atPx} ${label}`}>
          <Line x1={fromPx} x2={toPx} y1={atPx} y2={atPx} stroke={colours.hairline} strokeWidth={1} />
          <SvgLabel x={fromPx - 6} y={atPx + 4} anchor="end">
            {label}
          </SvgLabel>
        </G>
      ))}
    </G>
  )
}

/** Width of a label at the small size [px], near enough to keep labels apart. */
export function labelWidthPx(label: string): number {
  return label.length * 7
}

function roomyTicks(ticks: readonly Tick[]): Tick[] {
  const kept: Tick[] = []
  for (const tick of ticks) {
    const last = kept.at(-1)
    const gap = last ? tick.atPx - last.atPx - (labelWidthPx(tick.label) + labelWidthPx(last.label)) / 2 : Infinity
    if (gap >= 10) kept.push(tick)
  }
  return kept
}

function anchorOf(atPx: number, label: string, fromPx: number, toPx: number): 'start' | 'middle' | 'end' {
  const half = labelWidthPx(label) / 2
  if (atPx - half < fromPx - 2) return 'start'
  return atPx + half > toPx + 2 ? 'end' : 'middle'
}
