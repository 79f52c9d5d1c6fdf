import { useId, useImperativeHandle, useRef, useState, type Ref } from 'react'
import { StyleSheet, TextInput, View, type KeyboardTypeOptions, type TextInputProps } from 'react-native'
import { AppText } from './AppText'
import { FieldFrame, fieldIds, type FieldProps } from './FieldFrame'
import { fontFamily } from './theme/fonts'
import { useTheme } from './theme/ThemeProvider'
import { RADIUS, SPACE, TARGET, TYPE } from './theme/tokens'
import { webOnly } from './web/webOnly'

/** What a form library needs to lead a person to a field. */
export interface FocusTarget {
  focus(): void
}

export interface TextFieldProps extends FieldProps {
  readonly value: string
  readonly onChange: (text: string) => void
  readonly onBlur?: () => void
  readonly placeholder?: string
  readonly multiline?: boolean
  readonly lines?: number
  /** Hides what is typed. */
  readonly secure?: boolean
  readonly autoComplete?: TextInputProps['autoComplete']
  readonly keyboard?: KeyboardTypeOptions
  /** Unit or ending, written inside the frame. */
  readonly suffix?: string
  readonly required?: boolean
  readonly maxLength?: number
  readonly autoFocus?: boolean
  /** Enter pressed in a field of one line. */
  readonly onSubmit?: () => void
  readonly align?: 'left' | 'right'
  readonly ref?: Ref<FocusTarget>
}

/** A line (or some lines) of typing. */
export function TextField(props: TextFieldProps) {
  const { disabled = false, suffix, error, onBlur } = props
  const { colours } = useTheme()
  const [isFocused, setIsFocused] = useState(false)
  const input = useRef<TextInput>(null)
  const ids = fieldIds(useId())
  useImperativeHandle(props.ref, () => ({ focus: () => input.current?.focus() }), [])
  const frameColour = error ? colours.error : isFocused ? colours.selection : colours.rule
  return (
    <FieldFrame {...props} ids={ids} onPressLabel={() => input.current?.focus()}>
      <View
        style={[
          styles.frame,
          { borderColor: frameColour, backgroundColor: disabled ? colours.sunken : colours.field },
          (isFocused || error) && styles.strong,
        ]}
      >
        <TextInput
          ref={input}
          {...inputProps(props)}
          onFocus={() => setIsFocused(true)}
          onBlur={() => {
            setIsFocused(false)
            onBlur?.()
          }}
          placeholderTextColor={colours.inkSoft}
          aria-label={props.label}
          aria-labelledby={ids.label}
          {...webOnly({
            'aria-describedby': error || props.hint ? ids.note : undefined,
            'aria-invalid': error ? true : undefined,
            'aria-required': props.required ? true : undefined,
            dataSet: { insetFocus: '' },
          })}
          style={[
            styles.input,
            { color: colours.ink, fontFamily: fontFamily('regular'), textAlign: props.align ?? 'left' },
            props.multiline && styles.multiline,
          ]}
        />
        {suffix ? (
          <View style={styles.suffix}>
            <AppText soft>{suffix}</AppText>
          </View>
        ) : null}
      </View>
    </FieldFrame>
  )
}

function inputProps(props: TextFieldProps): TextInputProps {
  const { multiline = false, secure = false, keyboard = 'default' } = props
  return {
    value: props.value,
    onChangeText: props.onChange,
    onSubmitEditing: props.onSubmit,
    editable: !props.disabled,
    multiline,
    numberOfLines: multiline ? (props.lines ?? 4) : undefined,
    secureTextEntry: secure,
    autoComplete: props.autoComplete,
    autoCapitalize: secure || keyboard === 'email-address' ? 'none' : 'sentences',
    keyboardType: keyboard,
    maxLength: props.maxLength,
    autoFocus: props.autoFocus,
    placeholder: props.placeholder,
  }
}

const styles = StyleSheet.create({
  frame: { flexDirection: 'row', alignItems: 'stretch', minHeight: TARGET, borderWidth: 1.5, borderRadius: RADIUS },
  strong: { borderWidth: 2 },
  input: {
    flexGrow: 1,
    flexShrink: 1,
    minWidth: 0,
    minHeight: TARGET - 4,
    paddingHorizontal: SPACE.medium,
    paddingVertical: SPACE.small,
    fontSize: TYPE.lead,
    fontVariant: ['tabular-nums'],
    borderRadius: RADIUS,
  },
  multiline: { minHeight: TARGET * 2, textAlignVertical: 'top' },
  suffix: { justifyContent: 'center', paddingRight: SPACE.medium },
})
