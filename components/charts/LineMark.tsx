import Svg, { Line, Rect } from 'react-native-svg'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { toneColour } from '@/components/ui/theme/tokens'
import { BAND_LINES } from './BandChart'

interface LineMarkProps {
  /** Place of the series in its chart, from 0. */
  readonly place: number
}

/** A piece of a chart's line and band, for its legend. */
export function LineMark({ place }: LineMarkProps) {
  const { colours } = useTheme()
  const { tone, dash } = BAND_LINES[place % BAND_LINES.length] ?? { tone: 'ink' as const }
  const colour = toneColour(tone, colours)
  return (
    <Svg width={34} height={16} viewBox="0 0 34 16" aria-hidden>
      <Rect width={34} height={16} fill={colour} fillOpacity={0.16} />
      <Line x1={0} x2={34} y1={8} y2={8} stroke={colour} strokeWidth={2.25} strokeDasharray={dash} />
    </Svg>
  )
}
