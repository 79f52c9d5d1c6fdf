import { useState } from 'react'
import { View } from 'react-native'
import { Button } from './Button'
import { Choice } from './Choice'
import { useMessages } from './MessagesProvider'
import type { SelectProps } from './Select.types'

/** One of many answers: the chosen one, which opens the list of all. */
export function Select<Value extends string>(props: SelectProps<Value>) {
  const { options, value, onChange, label, error, disabled } = props
  const { t } = useMessages()
  const [isOpen, setIsOpen] = useState(false)
  const chosen = options.find((option) => option.value === value)
  const said = chosen?.label ?? props.placeholder ?? t('common.choose')
  return (
    <View>
      <Button
        label={`${label}: ${said}`}
        icon={isOpen ? 'up' : 'down'}
        expanded={isOpen}
        disabled={disabled}
        onPress={() => setIsOpen(!isOpen)}
      />
      {isOpen || error ? (
        <Choice
          {...props}
          layout="stack"
          onChange={(next) => {
            onChange(next)
            setIsOpen(false)
          }}
        />
      ) : null}
    </View>
  )
}
