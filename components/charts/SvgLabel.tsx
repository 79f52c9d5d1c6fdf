import { Text } from 'react-native-svg'
import { fontFamily, type Weight } from '@/components/ui/theme/fonts'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { TYPE } from '@/components/ui/theme/tokens'

interface SvgLabelProps {
  readonly x: number
  /** Baseline [px]. */
  readonly y: number
  readonly children: string
  readonly anchor?: 'start' | 'middle' | 'end'
  readonly weight?: Weight
  /** Soft ink when left out. */
  readonly colour?: string
}

/** A text inside a drawing. */
export function SvgLabel({ x, y, children, anchor = 'start', weight = 'regular', colour }: SvgLabelProps) {
  const { colours } = useTheme()
  return (
    <Text
      x={x}
      y={y}
      textAnchor={anchor}
      fill={colour ?? colours.inkSoft}
      fontFamily={fontFamily(weight)}
      fontSize={TYPE.small}
    >
      {children}
    </Text>
  )
}
