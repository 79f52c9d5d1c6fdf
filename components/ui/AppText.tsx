import type { ReactNode } from 'react'
import { Text, type StyleProp, type TextStyle } from 'react-native'
import { fontFamily, type Weight } from './theme/fonts'
import { useTheme } from './theme/ThemeProvider'
import { LINE, toneColour, TYPE, type Tone, type TypeSize } from './theme/tokens'
import { webOnly } from './web/webOnly'

/**
 * What a text is: the `title` of a screen, the `heading` of a panel, `lead` for the name of a thing, `body`, a `label`
 * above or beside a value, a large `figure`, or a `number` in a row, in tabular figures.
 */
export type TextKind = 'title' | 'heading' | 'lead' | 'body' | 'label' | 'figure' | 'number'

interface KindStyle {
  readonly size: TypeSize
  readonly weight: Weight
  readonly level?: 1 | 2 | 3
}

const KINDS: Readonly<Record<TextKind, KindStyle>> = {
  title: { size: 'heading', weight: 'bold', level: 1 },
  heading: { size: 'lead', weight: 'semibold', level: 2 },
  lead: { size: 'lead', weight: 'semibold' },
  body: { size: 'body', weight: 'regular' },
  label: { size: 'small', weight: 'medium' },
  figure: { size: 'figure', weight: 'semibold' },
  number: { size: 'body', weight: 'regular' },
}

export interface AppTextProps {
  readonly children: ReactNode
  /** `body` when left out. */
  readonly kind?: TextKind
  readonly size?: TypeSize
  readonly weight?: Weight
  /** Quieter ink, for what stands beside the answer. */
  readonly soft?: boolean
  readonly tone?: Tone
  /** Level of a heading, when it is not that of its kind. */
  readonly level?: 1 | 2 | 3 | 4
  readonly align?: 'left' | 'center' | 'right'
  /** Cuts the text off after so many lines. */
  readonly lines?: number
  /** So that another element can be labelled or described by this text. */
  readonly id?: string
  /** Keeps the text from screen readers, when something else says it. */
  readonly hidden?: boolean
  readonly style?: StyleProp<TextStyle>
  /** For the label of a field, which leads to it; anything else to press is a `Button`. */
  readonly onPress?: () => void
}

/** Every text of the app: one of five sizes, four weights, in ink. */
export function AppText(props: AppTextProps) {
  const { children, kind = 'body', tone, soft, align, lines, id, hidden, style } = props
  const { colours } = useTheme()
  const { size, weight, level: kindLevel } = KINDS[kind]
  const chosenSize = props.size ?? size
  const level = props.level ?? kindLevel
  const isTabular = kind === 'figure' || kind === 'number'
  const colour = tone ? toneColour(tone, colours) : soft || kind === 'label' ? colours.inkSoft : colours.ink
  return (
    <Text
      {...(level ? { role: 'heading' as const, 'aria-level': level } : {})}
      {...(id ? { nativeID: id } : {})}
      {...(hidden ? webOnly({ 'aria-hidden': true }) : {})}
      numberOfLines={lines}
      {...(props.onPress ? { onPress: props.onPress, ...webOnly({ tabIndex: -1 }) } : {})}
      style={[
        {
          color: colour,
          fontFamily: fontFamily(props.weight ?? weight),
          fontSize: TYPE[chosenSize],
          lineHeight: LINE[chosenSize],
          textAlign: align,
        },
        isTabular && tabular,
        style,
      ]}
    >
      {children}
    </Text>
  )
}

const tabular: TextStyle = { fontVariant: ['tabular-nums'] }
