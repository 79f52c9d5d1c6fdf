import { scaleBand } from 'd3-scale'
import { useId } from 'react'
import { G, Line, Rect } from 'react-native-svg'
import type { Material } from '@/shared/compute/factors/vocabulary'
import { MATERIAL_HATCHES } from '@/shared/hatches/materialHatches'
import { useMessages } from '@/components/ui/MessagesProvider'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { formatMass, formatYearRange } from '@/shared/format'
import { labelWidthPx, XAxis, YAxis } from './Axis'
import { ChartFrame } from './ChartFrame'
import { HatchDefs, hatchFill } from './hatches'
import { massScale } from './massScale'

/** What comes down in one year, by material, with the span of its total. */
export interface FlowYear {
  readonly year: number
  readonly parts: readonly { readonly material: Material; readonly massKg: number }[]
  /** P10 and P90 of the total [kg/yr]; no whisker without them. */
  readonly lowKg?: number
  readonly highKg?: number
}

interface StackedFlowsProps {
  /** What is drawn: "Years ahead". */
  readonly title: string
  readonly flows: readonly FlowYear[]
  /** Materials from the foot upwards; the order of the first year when left out. */
  readonly order?: readonly Material[]
  readonly selectedYear?: number | null
  /** A press on a year; the table beside the chart gives the same to the keyboard. */
  readonly onPressYear?: (year: number) => void
  /** 260 when left out. */
  readonly heightPx?: number
}

/** Below this width of a bar its hatch cannot be told, and the plain ground is drawn [px]. */
const HATCH_FROM_PX = 6
const FOOT_PX = 24
const HEAD_PX = 14

/** Flows year by year: bars stacked by material, whiskers from low to high of the total. */
export function StackedFlows(props: StackedFlowsProps) {
  const { title, flows, onPressYear, heightPx = 260 } = props
  const { t, locale } = useMessages()
  const totals = flows.map(totalKg)
  const peak = totals.indexOf(Math.max(...totals))
  const first = flows[0]
  const last = flows.at(-1)
  const label =
    first && last
      ? t('common.charts.stackedFlows', {
          title,
          years: formatYearRange(first.year, last.year),
          peakYear: flows[peak]?.year ?? first.year,
          peak: formatMass(totals[peak] ?? 0, locale),
        })
      : `${title}. ${t('common.charts.empty')}`
  return (
    <ChartFrame
      label={label}
      heightPx={heightPx}
      onPressAt={
        onPressYear
          ? (xPx, widthPx) => {
              const { bands } = flowScales(flows, widthPx, heightPx, locale)
              const pressed = flows.find(({ year }) => xPx < (bands(year) ?? 0) + bands.step())
              if (pressed) onPressYear(pressed.year)
            }
          : undefined
      }
    >
      {(widthPx) => <Drawing {...props} widthPx={widthPx} heightPx={heightPx} />}
    </ChartFrame>
  )
}

function totalKg({ parts }: FlowYear): number {
  return parts.reduce((sum, { massKg }) => sum + massKg, 0)
}

function flowScales(flows: readonly FlowYear[], widthPx: number, heightPx: number, locale: string) {
  const groundPx = heightPx - FOOT_PX
  const mostKg = Math.max(0, ...flows.map((flow) => Math.max(totalKg(flow), flow.highKg ?? 0)))
  const { yPx, ticks } = massScale(mostKg, groundPx, HEAD_PX, locale)
  const leftPx = Math.max(28, ...ticks.map(({ label }) => labelWidthPx(label) + 8))
  const bands = scaleBand<number>()
    .domain(flows.map(({ year }) => year))
    .range([leftPx, widthPx])
    .paddingInner(0.18)
    .paddingOuter(0.1)
  return { bands, yPx, ticks, leftPx, groundPx }
}

interface DrawingProps extends StackedFlowsProps {
  readonly widthPx: number
  readonly heightPx: number
}

function Drawing({ flows, order, selectedYear, widthPx, heightPx }: DrawingProps) {
  const { locale } = useMessages()
  const { colours } = useTheme()
  const prefix = useId()
  const { bands, yPx, ticks, leftPx, groundPx } = flowScales(flows, widthPx, heightPx, locale)
  const years = flows.map(({ year }) => year)
  const materials = order ?? flows[0]?.parts.map(({ material }) => material) ?? []
  const barPx = bands.bandwidth()
  return (
    <G>
      <HatchDefs prefix={prefix} materials={materials} scale={barPx < 18 ? 'calm' : 'full'} />
      <YAxis ticks={ticks} fromPx={leftPx} toPx={widthPx} />
      {flows.map((flow) => {
        const x = bands(flow.year) ?? 0
        return (
          <G key={flow.year}>
            {selectedYear === flow.year ? (
              <Rect
                x={x - 2}
                y={2}
                width={barPx + 4}
                height={groundPx}
                fill="none"
                stroke={colours.selection}
                strokeWidth={3}
              />
            ) : null}
            {stackOf(flow, materials).map(({ material, fromKg, toKg }) => (
              <Rect
                key={material}
                x={x}
                y={yPx(toKg)}
                width={barPx}
                height={Math.max(0, yPx(fromKg) - yPx(toKg))}
                fill={barPx < HATCH_FROM_PX ? MATERIAL_HATCHES[material].ground : hatchFill(prefix, material)}
                stroke={barPx < HATCH_FROM_PX ? 'none' : STONE_EDGE}
                strokeWidth={0.75}
              />
            ))}
            <Whisker flow={flow} x={x + barPx / 2} yPx={yPx} />
          </G>
        )
      })}
      <XAxis
        ticks={yearTicks(years).map((year) => ({ atPx: (bands(year) ?? 0) + barPx / 2, label: String(year) }))}
        fromPx={leftPx}
        toPx={widthPx}
        yPx={groundPx}
      />
    </G>
  )
}

/** Edge between stones; the hatch grounds are the same in every theme, so it is as well. */
const STONE_EDGE = '#20292E'

interface WhiskerProps {
  readonly flow: FlowYear
  readonly x: number
  readonly yPx: (massKg: number) => number
}

function Whisker({ flow: { lowKg, highKg }, x, yPx }: WhiskerProps) {
  const { colours } = useTheme()
  if (lowKg === undefined || highKg === undefined) return null
  return (
    <G>
      <Line x1={x} x2={x} y1={yPx(lowKg)} y2={yPx(highKg)} stroke={colours.panel} strokeWidth={4} />
      <Line x1={x} x2={x} y1={yPx(lowKg)} y2={yPx(highKg)} stroke={colours.ink} strokeWidth={1.75} />
    </G>
  )
}

function stackOf(flow: FlowYear, materials: readonly Material[]) {
  let fromKg = 0
  return materials.flatMap((material) => {
    const massKg = flow.parts.find((part) => part.material === material)?.massKg ?? 0
    if (!(massKg > 0)) return []
    const stone = { material, fromKg, toKg: fromKg + massKg }
    fromKg = stone.toKg
    return [stone]
  })
}

/** Years that a reader looks for: the first, and the round ones. */
function yearTicks(years: readonly number[]): number[] {
  const step = years.length > 60 ? 20 : years.length > 24 ? 10 : years.length > 8 ? 5 : 1
  return years.filter((year, place) => place === 0 || year % step === 0)
}
