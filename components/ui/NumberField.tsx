import { useState, type Ref } from 'react'
import type { FieldProps } from './FieldFrame'
import { useMessages } from './MessagesProvider'
import { parseTypedNumber } from './parseTypedNumber'
import { TextField, type FocusTarget } from './TextField'

export interface NumberFieldProps extends FieldProps {
  /** The number, or null while the field is empty or holds no number. */
  readonly value: number | null
  readonly onChange: (value: number | null) => void
  readonly onBlur?: () => void
  /** Unit, written inside the frame. */
  readonly unit?: string
  readonly placeholder?: string
  readonly required?: boolean
  /** No decimals: a keyboard of digits. */
  readonly whole?: boolean
  /** Years are written without separators. */
  readonly grouping?: boolean
  readonly ref?: Ref<FocusTarget>
}

/**
 * A number, typed with the separators of any language. What was typed stays as it was typed; a value that comes from
 * elsewhere is written anew.
 */
export function NumberField(props: NumberFieldProps) {
  const { value, onChange, error, whole = false, grouping = false } = props
  const { t, locale } = useMessages()
  const [typed, setTyped] = useState(() => written(value, locale, grouping))
  const parsed = parseTypedNumber(typed, locale)
  const meant = parsed !== null && Number.isNaN(parsed) ? null : parsed
  const [lastValue, setLastValue] = useState(value)
  if (value !== lastValue) {
    setLastValue(value)
    if (value !== meant) setTyped(written(value, locale, grouping))
  }
  const isNoNumber = parsed !== null && Number.isNaN(parsed)
  return (
    <TextField
      {...props}
      value={typed}
      onChange={(text) => {
        setTyped(text)
        const next = parseTypedNumber(text, locale)
        onChange(next === null || Number.isNaN(next) ? null : next)
      }}
      error={isNoNumber ? t('common.notANumber') : error}
      keyboard={whole ? 'number-pad' : 'decimal-pad'}
      suffix={props.unit}
      autoComplete="off"
    />
  )
}

function written(value: number | null, locale: string, useGrouping: boolean): string {
  if (value === null || !Number.isFinite(value)) return ''
  return new Intl.NumberFormat(locale, { useGrouping, maximumFractionDigits: 10 }).format(value)
}
