import { KnownByPicker } from '@/components/ui/KnownByPicker'
import type { KnownBy } from '@/shared/schemas/sheet'

interface GroupKnownByProps<Answer extends { readonly knownBy?: KnownBy | undefined }> {
  readonly of: string
  readonly answer: Answer | undefined
  /** Whether it says something: "not known" is not known by anything. */
  readonly isKnown: boolean
  readonly onChange: (answer: Answer) => void
}

/** How the answer of one group is known, where it says something. */
export function GroupKnownBy<Answer extends { readonly knownBy?: KnownBy | undefined }>({
  of,
  answer,
  isKnown,
  onChange,
}: GroupKnownByProps<Answer>) {
  if (!answer || !isKnown) return null
  return (
    <KnownByPicker of={of} value={answer.knownBy ?? null} onChange={(knownBy) => onChange({ ...answer, knownBy })} />
  )
}
