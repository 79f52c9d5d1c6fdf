import { useId, useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { FieldFrame, fieldIds } from './FieldFrame'
import { Icon } from './Icon'
import { useMessages } from './MessagesProvider'
import type { SelectProps } from './Select.types'
import { fontFamily } from './theme/fonts'
import { useTheme } from './theme/ThemeProvider'
import { LINE, RADIUS, SPACE, TARGET, TYPE } from './theme/tokens'

/** One of many answers, in the browser's own list. */
export function Select<Value extends string>(props: SelectProps<Value>) {
  const { options, value, onChange, onBlur, disabled = false, error, hint } = props
  const { colours } = useTheme()
  const { t } = useMessages()
  const [isFocused, setIsFocused] = useState(false)
  const id = useId()
  const ids = fieldIds(id)
  const frameColour = error ? colours.error : isFocused ? colours.selection : colours.rule
  return (
    <FieldFrame {...props} ids={ids}>
      <View>
        <select
          id={id}
          value={value ?? ''}
          disabled={disabled}
          required={props.required}
          aria-label={props.label}
          aria-labelledby={ids.label}
          aria-describedby={error || hint ? ids.note : undefined}
          aria-invalid={error ? true : undefined}
          onFocus={() => setIsFocused(true)}
          onBlur={() => {
            setIsFocused(false)
            onBlur?.()
          }}
          onChange={(event) => {
            const chosen = options.find((option) => option.value === event.target.value)
            if (chosen) onChange(chosen.value)
          }}
          style={{
            appearance: 'none',
            width: '100%',
            minHeight: TARGET,
            padding: `${SPACE.small}px ${SPACE.huge + SPACE.small}px ${SPACE.small}px ${SPACE.medium}px`,
            border: `1.5px solid ${frameColour}`,
            borderRadius: RADIUS,
            backgroundColor: disabled ? colours.sunken : colours.field,
            color: colours.ink,
            fontFamily: fontFamily('medium'),
            fontSize: TYPE.lead,
            lineHeight: `${LINE.lead}px`,
            textOverflow: 'ellipsis',
          }}
        >
          {value === null ? (
            <option value="" disabled>
              {props.placeholder ?? t('common.choose')}
            </option>
          ) : null}
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
        <View style={styles.arrow}>
          <Icon name="down" size={20} colour={colours.inkSoft} />
        </View>
      </View>
    </FieldFrame>
  )
}

const styles = StyleSheet.create({
  arrow: {
    position: 'absolute',
    right: SPACE.medium,
    top: 0,
    bottom: 0,
    justifyContent: 'center',
    pointerEvents: 'none',
  },
})
