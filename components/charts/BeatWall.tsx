import { useId } from 'react'
import { View } from 'react-native'
import Svg, { G, Path, Pattern, Rect } from 'react-native-svg'
import { useMessages } from '@/components/ui/MessagesProvider'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { SPACE, type Colours } from '@/components/ui/theme/tokens'
import { formatCount } from '@/shared/format'
import { Legend } from './Legend'
import { SvgDefs } from './SvgDefs'
import { useMeasuredWidth } from './useMeasuredWidth'
import { wallLayout } from './wallLayout'

/** How far a building of the beat has come. */
export type BrickState = 'handed-in' | 'in-the-bag' | 'sent-back' | 'to-do'

interface BeatWallProps {
  readonly handedIn: number
  readonly inTheBag: number
  readonly sentBack: number
  readonly toDo: number
  /** Height that the wall may reach [px]; 150 when left out. */
  readonly mostHeightPx?: number
  readonly showLegend?: boolean
}

/** The beat as a wall that fills: a brick a building, laid from the foot. */
export function BeatWall(props: BeatWallProps) {
  const { handedIn, inTheBag, sentBack, toDo, mostHeightPx = 150, showLegend = true } = props
  const { t, locale } = useMessages()
  const prefix = useId()
  const [widthPx, onLayout] = useMeasuredWidth()
  const states: readonly (readonly [BrickState, number])[] = [
    ['handed-in', handedIn],
    ['sent-back', sentBack],
    ['in-the-bag', inTheBag],
    ['to-do', toDo],
  ]
  const laid = states.flatMap(([state, count]) => Array.from({ length: count }, () => state))
  const wall = wallLayout(laid.length, widthPx, mostHeightPx)
  const figures = { handedIn, inTheBag, sentBack, toDo, total: laid.length }
  return (
    <View style={{ gap: SPACE.small }}>
      <View role="img" aria-label={t('common.charts.beatWall', figures)} onLayout={onLayout}>
        <Svg width={widthPx} height={wall.heightPx} viewBox={`0 0 ${widthPx} ${wall.heightPx}`}>
          <BagHatch prefix={prefix} />
          {wall.bricks.map(({ x, y }, place) => (
            <G key={`${x} ${y}`}>
              <BrickShape
                x={x}
                y={y}
                width={wall.brickWidthPx}
                height={wall.brickHeightPx}
                state={laid[place] ?? 'to-do'}
                prefix={prefix}
              />
            </G>
          ))}
        </Svg>
      </View>
      {showLegend ? (
        <Legend
          entries={states
            .filter(([, count]) => count > 0)
            .map(([state, count]) => ({
              key: state,
              label: t(`vocabulary.state.${state}`),
              value: formatCount(count, locale),
              mark: <BrickMark state={state} />,
            }))}
        />
      ) : null}
    </View>
  )
}

function BrickMark({ state }: { readonly state: BrickState }) {
  const prefix = useId()
  return (
    <Svg width={18} height={14} viewBox="0 0 18 14" aria-hidden>
      <BagHatch prefix={prefix} />
      <BrickShape x={1} y={1} width={16} height={12} state={state} prefix={prefix} />
    </Svg>
  )
}

interface BrickShapeProps {
  readonly x: number
  readonly y: number
  readonly width: number
  readonly height: number
  readonly state: BrickState
  readonly prefix: string
}

function BrickShape({ x, y, width, height, state, prefix }: BrickShapeProps) {
  const { colours } = useTheme()
  const isSmall = width < 8
  return (
    <>
      <Rect
        x={x + 0.5}
        y={y + 0.5}
        width={width - 1}
        height={height - 1}
        fill={brickFill(state, colours, prefix, isSmall)}
        stroke={state === 'sent-back' ? colours.error : colours.rule}
        strokeWidth={isSmall ? 0.75 : 1.2}
      />
      {state === 'sent-back' ? (
        <Path
          d={`M${x + 1} ${y + 1}L${x + width - 1} ${y + height - 1}M${x + width - 1} ${y + 1}L${x + 1} ${y + height - 1}`}
          stroke={colours.error}
          strokeWidth={1.2}
        />
      ) : null}
    </>
  )
}

function brickFill(state: BrickState, colours: Colours, prefix: string, isSmall: boolean): string {
  switch (state) {
    case 'handed-in':
      return colours.good
    case 'in-the-bag':
      return isSmall ? colours.action : `url(#${hatchName(prefix)})`
    case 'sent-back':
    case 'to-do':
      return colours.field
  }
}

function hatchName(prefix: string): string {
  return `bag-${prefix.replace(/[^\w-]/g, '')}`
}

function BagHatch({ prefix }: { readonly prefix: string }) {
  const { colours } = useTheme()
  return (
    <SvgDefs>
      <Pattern id={hatchName(prefix)} patternUnits="userSpaceOnUse" width={5} height={5}>
        <Rect width={5} height={5} fill={colours.field} />
        <Path d="M-1 6L6 -1M-1 1L1 -1M4 6L6 4" stroke={colours.action} strokeWidth={1.6} />
      </Pattern>
    </SvgDefs>
  )
}
