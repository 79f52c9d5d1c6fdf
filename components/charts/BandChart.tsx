import { scaleLinear } from 'd3-scale'
import { area, line } from 'd3-shape'
import { G, Line, Path } from 'react-native-svg'
import { useMessages } from '@/components/ui/MessagesProvider'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { toneColour, type Tone } from '@/components/ui/theme/tokens'
import { formatMass, formatYearRange } from '@/shared/format'
import { labelWidthPx, XAxis, YAxis } from './Axis'
import { ChartFrame } from './ChartFrame'
import { massScale } from './massScale'
import { SvgLabel } from './SvgLabel'

/** A year of a series: likely, and P10 to P90. */
export interface BandPoint {
  readonly year: number
  readonly likelyKg: number
  readonly lowKg?: number
  readonly highKg?: number
}

/** One line with its band, such as one scenario. */
export interface BandSeries {
  readonly key: string
  readonly label: string
  readonly points: readonly BandPoint[]
}

interface BandChartProps {
  readonly title: string
  /** Up to four; they differ by colour and by the dashes of their line. */
  readonly series: readonly BandSeries[]
  /** A year to mark, such as the survey's. */
  readonly markedYear?: number
  /** 260 when left out. */
  readonly heightPx?: number
}

/** Look of the first, second … line, for a legend as well. */
export const BAND_LINES: readonly { readonly tone: Tone; readonly dash?: string }[] = [
  { tone: 'action' },
  { tone: 'selection', dash: '9 4' },
  { tone: 'good', dash: '2 4' },
  { tone: 'attention', dash: '12 4 2 4' },
]

const FOOT_PX = 24
const HEAD_PX = 14

/** Series over the years, each a line with its band from low to high. */
export function BandChart(props: BandChartProps) {
  const { title, series, heightPx = 260 } = props
  const { t, locale } = useMessages()
  const points = series[0]?.points ?? []
  const [first, last] = [points[0], points.at(-1)]
  const label =
    first && last
      ? t('common.charts.band', {
          title,
          years: formatYearRange(first.year, last.year),
          first: formatMass(first.likelyKg, locale),
          last: formatMass(last.likelyKg, locale),
        })
      : `${title}. ${t('common.charts.empty')}`
  return (
    <ChartFrame label={label} heightPx={heightPx}>
      {(widthPx) => <Drawing {...props} widthPx={widthPx} heightPx={heightPx} />}
    </ChartFrame>
  )
}

interface DrawingProps extends BandChartProps {
  readonly widthPx: number
  readonly heightPx: number
}

function Drawing({ series, markedYear, widthPx, heightPx }: DrawingProps) {
  const { locale } = useMessages()
  const { colours } = useTheme()
  const all = series.flatMap(({ points }) => points)
  const years = all.map(({ year }) => year)
  const groundPx = heightPx - FOOT_PX
  const mostKg = Math.max(0, ...all.map(({ likelyKg, highKg }) => Math.max(likelyKg, highKg ?? 0)))
  const { yPx, ticks } = massScale(mostKg, groundPx, HEAD_PX, locale)
  const leftPx = Math.max(28, ...ticks.map(({ label }) => labelWidthPx(label) + 8))
  const x = scaleLinear()
    .domain([Math.min(...years, Infinity), Math.max(...years, -Infinity)])
    .range([leftPx, widthPx - 4])
  if (all.length === 0) return null
  return (
    <G>
      <YAxis ticks={ticks} fromPx={leftPx} toPx={widthPx} />
      {series.map(({ key, points }, place) => {
        const { tone, dash } = BAND_LINES[place % BAND_LINES.length] ?? { tone: 'ink' as const }
        const colour = toneColour(tone, colours)
        const banded = points.filter(({ lowKg, highKg }) => lowKg !== undefined && highKg !== undefined)
        const band = area<BandPoint>()
          .x(({ year }) => x(year))
          .y0(({ lowKg, likelyKg }) => yPx(lowKg ?? likelyKg))
          .y1(({ highKg, likelyKg }) => yPx(highKg ?? likelyKg))
        const likely = line<BandPoint>()
          .x(({ year }) => x(year))
          .y(({ likelyKg }) => yPx(likelyKg))
        return (
          <G key={key}>
            <Path d={band(banded) ?? ''} fill={colour} fillOpacity={series.length > 1 ? 0.14 : 0.2} />
            <Path d={likely(points) ?? ''} fill="none" stroke={colour} strokeWidth={2.25} strokeDasharray={dash} />
          </G>
        )
      })}
      {markedYear === undefined ? null : (
        <G>
          <Line
            x1={x(markedYear)}
            x2={x(markedYear)}
            y1={HEAD_PX}
            y2={groundPx}
            stroke={colours.ink}
            strokeWidth={1}
            strokeDasharray="3 3"
          />
          <SvgLabel x={x(markedYear) + 4} y={HEAD_PX + 10} colour={colours.ink}>
            {String(markedYear)}
          </SvgLabel>
        </G>
      )}
      <XAxis
        ticks={x.ticks(Math.max(2, Math.floor(widthPx / 110))).map((year) => ({ atPx: x(year), label: String(year) }))}
        fromPx={leftPx}
        toPx={widthPx}
        yPx={groundPx}
      />
    </G>
  )
}
