import { scaleLinear } from 'd3-scale'
import { area, curveStepAfter, line } from 'd3-shape'
import { G, Line, Path } from 'react-native-svg'
import { useMessages } from '@/components/ui/MessagesProvider'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { toneColour } from '@/components/ui/theme/tokens'
import { formatCount, formatShare } from '@/shared/format'
import { XAxis, YAxis } from './Axis'
import { BAND_LINES } from './BandChart'
import { ChartFrame } from './ChartFrame'
import { SvgLabel } from './SvgLabel'

/** Share still standing at an age, with its interval where there is one. */
export interface SurvivalPoint {
  readonly ageYears: number
  readonly share: number
  readonly lowShare?: number
  readonly highShare?: number
}

/** One curve: a fitted function as a line, or what was observed as steps. */
export interface SurvivalSeries {
  readonly key: string
  readonly label: string
  readonly points: readonly SurvivalPoint[]
  readonly isObserved?: boolean
}

interface SurvivalCurveProps {
  readonly title: string
  readonly series: readonly SurvivalSeries[]
  /** 260 when left out. */
  readonly heightPx?: number
}

const FOOT_PX = 24
const HEAD_PX = 14
const LEFT_PX = 46

/** Share of a cohort still standing, by age; a dotted line marks the age at which half is gone. */
export function SurvivalCurve({ title, series, heightPx = 260 }: SurvivalCurveProps) {
  const { t, locale } = useMessages()
  const half = halfAge(series[0]?.points ?? [])
  const label = half === null ? title : t('common.charts.survival', { title, years: formatCount(half, locale) })
  return (
    <ChartFrame label={label} heightPx={heightPx}>
      {(widthPx) => <Drawing series={series} half={half} widthPx={widthPx} heightPx={heightPx} />}
    </ChartFrame>
  )
}

interface DrawingProps {
  readonly series: readonly SurvivalSeries[]
  readonly half: number | null
  readonly widthPx: number
  readonly heightPx: number
}

function Drawing({ series, half, widthPx, heightPx }: DrawingProps) {
  const { locale } = useMessages()
  const { colours } = useTheme()
  const groundPx = heightPx - FOOT_PX
  const oldest = Math.max(1, ...series.flatMap(({ points }) => points.map(({ ageYears }) => ageYears)))
  const x = scaleLinear()
    .domain([0, oldest])
    .range([LEFT_PX, widthPx - 4])
  const y = scaleLinear().domain([0, 1]).range([groundPx, HEAD_PX])
  return (
    <G>
      <YAxis
        ticks={[0.25, 0.5, 0.75, 1].map((share) => ({ atPx: y(share), label: formatShare(share, locale) }))}
        fromPx={LEFT_PX}
        toPx={widthPx}
      />
      {series.map((one, place) => (
        <Curve key={one.key} series={one} place={place} xPx={(age) => x(age)} yPx={(share) => y(share)} />
      ))}
      {half === null ? null : (
        <G>
          <Line x1={x(half)} x2={x(half)} y1={y(0.5)} y2={groundPx} stroke={colours.ink} strokeDasharray="2 3" />
          <SvgLabel x={x(half) + 5} y={y(0.5) - 6} weight="semibold" colour={colours.ink}>
            {formatCount(half, locale)}
          </SvgLabel>
        </G>
      )}
      <XAxis
        ticks={x
          .ticks(Math.max(3, Math.floor(widthPx / 100)))
          .map((age) => ({ atPx: x(age), label: formatCount(age, locale) }))}
        fromPx={LEFT_PX}
        toPx={widthPx}
        yPx={groundPx}
      />
    </G>
  )
}

interface CurveProps {
  readonly series: SurvivalSeries
  readonly place: number
  readonly xPx: (ageYears: number) => number
  readonly yPx: (share: number) => number
}

function Curve({ series: { points, isObserved }, place, xPx, yPx }: CurveProps) {
  const { colours } = useTheme()
  const { tone, dash } = BAND_LINES[place % BAND_LINES.length] ?? { tone: 'ink' as const }
  const colour = isObserved ? colours.ink : toneColour(tone, colours)
  const curve = line<SurvivalPoint>()
    .x(({ ageYears }) => xPx(ageYears))
    .y(({ share }) => yPx(share))
  const band = area<SurvivalPoint>()
    .x(({ ageYears }) => xPx(ageYears))
    .y0(({ lowShare, share }) => yPx(lowShare ?? share))
    .y1(({ highShare, share }) => yPx(highShare ?? share))
  if (isObserved) {
    curve.curve(curveStepAfter)
    band.curve(curveStepAfter)
  }
  return (
    <G>
      <Path d={band([...points]) ?? ''} fill={colour} fillOpacity={0.14} />
      <Path
        d={curve([...points]) ?? ''}
        fill="none"
        stroke={colour}
        strokeWidth={2.25}
        strokeDasharray={isObserved ? undefined : dash}
      />
    </G>
  )
}

/** Age at which half is gone [yr], on the line between two points; null when the curve does not come down to it. */
function halfAge(points: readonly SurvivalPoint[]): number | null {
  for (const [place, point] of points.entries()) {
    if (point.share > 0.5) continue
    const before = points[place - 1]
    if (!before || before.share === point.share) return point.ageYears
    const part = (before.share - 0.5) / (before.share - point.share)
    return before.ageYears + part * (point.ageYears - before.ageYears)
  }
  return null
}
