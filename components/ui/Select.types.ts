import type { FieldProps } from './FieldFrame'

/** One entry of a closed list. */
export interface SelectOption<Value extends string> {
  readonly value: Value
  readonly label: string
}

export interface SelectProps<Value extends string> extends FieldProps {
  readonly options: readonly SelectOption<Value>[]
  /** The chosen one, or null while none is. */
  readonly value: Value | null
  readonly onChange: (value: Value) => void
  readonly onBlur?: () => void
  /** What stands there while nothing is chosen; "Choose" when left out. */
  readonly placeholder?: string
  readonly required?: boolean
}
