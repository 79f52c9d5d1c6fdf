import { CheckBox } from '@/components/ui/CheckBox'
import { useMessages } from '@/components/ui/MessagesProvider'
import { NumberField } from '@/components/ui/NumberField'
import { Select } from '@/components/ui/Select'
import { TextField } from '@/components/ui/TextField'
import type { FactorColumn } from '@/shared/factorBook/factorColumns'
import type { MessageKey } from '@/shared/messages/messages.types'
import { cellName } from './cellName'

interface FactorFieldProps {
  readonly column: FactorColumn
  readonly value: string | number | boolean | null
  readonly onChange: (value: string | number | boolean | null) => void
  readonly error: string | undefined
}

/** One cell of a row, as a field that fits what the column holds. */
export function FactorField({ column, value, onChange, error }: FactorFieldProps) {
  const messages = useMessages()
  const { t } = messages
  const { field, kind, choices = [], isOptional, isWhole, longest = 0 } = column
  const label = t(`factorBook.field.${field}` as MessageKey)
  const shared = { label, ...(error ? { error } : {}), ...(isOptional ? { hint: t('common.optional') } : {}) }
  if (kind === 'yes-no') return <CheckBox {...shared} checked={value === true} onChange={onChange} />
  if (kind === 'number') {
    return (
      <NumberField
        {...shared}
        value={typeof value === 'number' ? value : null}
        onChange={onChange}
        whole={isWhole ?? false}
      />
    )
  }
  const text = typeof value === 'string' ? value : ''
  if (kind === 'choice') {
    return (
      <Select<string>
        {...shared}
        value={text === '' ? null : text}
        onChange={onChange}
        options={choices.map((choice) => ({ value: choice, label: cellName(field, choice, messages) }))}
      />
    )
  }
  return <TextField {...shared} value={text} onChange={onChange} multiline={longest > 300} />
}
