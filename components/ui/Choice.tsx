import { useId, useRef, type ReactNode, type Ref } from 'react'
import { Pressable, StyleSheet, View } from 'react-native'
import { AppText } from './AppText'
import { FieldFrame, fieldIds, type FieldProps } from './FieldFrame'
import { useTheme } from './theme/ThemeProvider'
import { RADIUS, SPACE, TARGET } from './theme/tokens'
import { webOnly } from './web/webOnly'

/** One answer among several. */
export interface ChoiceOption<Value extends string> {
  readonly value: Value
  readonly label: string
  /** A `Swatch` of a hatch, or an icon. */
  readonly swatch?: ReactNode
  readonly disabled?: boolean
}

export interface ChoiceProps<Value extends string> extends FieldProps {
  readonly options: readonly ChoiceOption<Value>[]
  /** The chosen one, or null while none is. */
  readonly value: Value | null
  readonly onChange: (value: Value) => void
  readonly onBlur?: () => void
  /** `chips` lie in rows and wrap; `segments` share one row; `stack` has one a row. `chips` when left out. */
  readonly layout?: 'chips' | 'segments' | 'stack'
  readonly ref?: Ref<View>
}

/** One of several answers, all in sight: chips to tap, or arrow keys. */
export function Choice<Value extends string>(props: ChoiceProps<Value>) {
  const { options, value, onChange, layout = 'chips', disabled = false, error } = props
  const ids = fieldIds(useId())
  const chips = useRef(new Map<Value, View>())
  const tabStop = value ?? options[0]?.value

  const step = (from: number, by: number): void => {
    const open = options.filter((option) => !option.disabled)
    const place = open.findIndex((option) => option.value === options[from]?.value)
    const next = open[(place + by + open.length) % open.length]
    if (!next) return
    onChange(next.value)
    chips.current.get(next.value)?.focus()
  }

  return (
    <FieldFrame {...props} ids={ids}>
      <View
        ref={props.ref}
        role="radiogroup"
        aria-labelledby={ids.label}
        {...webOnly({
          'aria-describedby': error || props.hint ? ids.note : undefined,
          'aria-invalid': error ? true : undefined,
        })}
        style={[styles.options, layout === 'segments' && styles.segments, layout === 'stack' && styles.stack]}
      >
        {options.map((option, place) => (
          <Chip
            key={option.value}
            option={option}
            isChosen={option.value === value}
            isTabStop={option.value === tabStop}
            isOff={disabled || option.disabled === true}
            grows={layout !== 'chips'}
            isCentred={layout === 'segments'}
            onPress={() => onChange(option.value)}
            onStep={(by) => step(place, by)}
            onBlur={props.onBlur}
            keep={(chip) => {
              if (chip) chips.current.set(option.value, chip)
              else chips.current.delete(option.value)
            }}
          />
        ))}
      </View>
    </FieldFrame>
  )
}

interface ChipProps<Value extends string> {
  readonly option: ChoiceOption<Value>
  readonly isChosen: boolean
  readonly isTabStop: boolean
  readonly isOff: boolean
  readonly grows: boolean
  readonly isCentred: boolean
  readonly onPress: () => void
  readonly onStep: (by: 1 | -1) => void
  readonly onBlur?: () => void
  readonly keep: (chip: View | null) => void
}

const STEPS: Readonly<Record<string, 1 | -1>> = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 }

function Chip<Value extends string>(props: ChipProps<Value>) {
  const { option, isChosen, isTabStop, isOff, grows, onPress, onStep, keep } = props
  const { colours } = useTheme()
  return (
    <Pressable
      ref={keep}
      role="radio"
      aria-checked={isChosen}
      aria-disabled={isOff}
      disabled={isOff}
      onPress={onPress}
      onBlur={props.onBlur}
      {...webOnly({
        tabIndex: isTabStop && !isOff ? 0 : -1,
        dataSet: { motion: '' },
        onKeyDown: (event: KeyboardEvent) => {
          const by = STEPS[event.key]
          if (!by) return
          event.preventDefault()
          onStep(by)
        },
      })}
      style={[
        styles.chip,
        grows && styles.grows,
        props.isCentred && styles.centred,
        { borderColor: colours.rule, backgroundColor: isChosen ? colours.chosen : colours.field },
        isOff && styles.off,
      ]}
    >
      {option.swatch}
      <AppText kind="lead" weight="medium" style={[styles.label, { color: isChosen ? colours.onChosen : colours.ink }]}>
        {option.label}
      </AppText>
    </Pressable>
  )
}

const styles = StyleSheet.create({
  options: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.small },
  segments: { flexWrap: 'nowrap', gap: 0, columnGap: SPACE.hair },
  stack: { flexDirection: 'column' },
  chip: {
    minHeight: TARGET,
    minWidth: TARGET,
    flexDirection: 'row',
    alignItems: 'center',
    gap: SPACE.small,
    borderWidth: 1.5,
    borderRadius: RADIUS,
    paddingHorizontal: SPACE.medium,
    paddingVertical: SPACE.small,
  },
  grows: { flexGrow: 1, flexShrink: 1 },
  centred: { justifyContent: 'center' },
  label: { flexShrink: 1 },
  off: { opacity: 0.5 },
})
