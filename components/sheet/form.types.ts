import type { SheetAnswers, SheetGroup } from '@/shared/schemas/sheet'

/** What every section of a sheet is given. */
export interface SectionProps {
  /** As they stand: server, bag, draft, and what the register offers. */
  readonly answers: SheetAnswers
  /** Groups that only the register or the outline says so far. */
  readonly offered: ReadonlySet<SheetGroup>
  /** Why a group cannot go in the bag as it is, in words. */
  readonly faults: Readonly<Partial<Record<SheetGroup, string>>>
  readonly answer: <Group extends SheetGroup>(group: Group, value: NonNullable<SheetAnswers[Group]>) => void
}
