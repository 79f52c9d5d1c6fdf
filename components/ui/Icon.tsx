import Svg, { Path } from 'react-native-svg'
import { LINES, type IconName } from './iconLines'
import { useTheme } from './theme/ThemeProvider'

interface IconProps {
  readonly name: IconName
  /** Edge [px]; 24 when left out. */
  readonly size?: number
  /** Ink when left out. */
  readonly colour?: string
}

/** A line drawing beside a text that says the same; screen readers pass it over. */
export function Icon({ name, size = 24, colour }: IconProps) {
  const { colours } = useTheme()
  return (
    <Svg width={size} height={size} viewBox="0 0 24 24" fill="none" aria-hidden>
      <Path
        d={LINES[name]}
        stroke={colour ?? colours.ink}
        strokeWidth={1.75}
        strokeLinecap="square"
        strokeLinejoin="miter"
      />
    </Svg>
  )
}
