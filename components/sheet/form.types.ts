import type { SheetAnswers, SheetGroup, UnconfirmedFrom } from '@/shared/schemas/sheet'

/** What every section of a sheet is given. */
export interface SectionProps {
  /** As they stand: server, bag, draft, and what the register offers. */
  readonly answers: SheetAnswers
  /** Groups nobody has confirmed by looking yet, and where their answer came from. */
  readonly unconfirmed: Unconfirmed
  /** Why a group cannot go in the bag as it is, in words. */
  readonly faults: Readonly<Partial<Record<SheetGroup, string>>>
  /** An answer given by the surveyor: it counts as confirmed. */
  readonly answer: <Group extends SheetGroup>(group: Group, value: NonNullable<SheetAnswers[Group]>) => void
  /** The answer that stands there is right. */
  readonly confirm: (groups: readonly SheetGroup[]) => void
}

export type Unconfirmed = Readonly<Partial<Record<SheetGroup, UnconfirmedFrom>>>
