import type { DeviceSheetState, SheetState } from '@/shared/schemas/sheet'

interface SheetFacts {
  readonly confirmed: SheetState | null
  /** Mutations of the sheet in the bag that the server has not answered. */
  readonly waiting: number
  /** Mutations that were answered, and not yet seen back. */
  readonly sent: number
  readonly hasDraft: boolean
}

/** State of a sheet as the surveyor sees it: the bag goes before the server's word, a question before a draft. */
export function deviceSheetState({ confirmed, waiting, sent, hasDraft }: SheetFacts): DeviceSheetState {
  if (waiting > 0) return 'in-the-bag'
  if (sent > 0) return 'handed-in'
  if (confirmed === 'sent-back') return 'sent-back'
  if (hasDraft) return 'started'
  return confirmed ?? 'to-do'
}
