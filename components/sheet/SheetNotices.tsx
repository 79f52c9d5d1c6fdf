import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import type { StoredSheet } from '@/db/fieldStore.types'
import type { SheetGroup } from '@/shared/schemas/sheet'
import type { Keeping } from './useKeptDraft'

interface SheetNoticesProps {
  readonly stored: StoredSheet
  readonly keeping: Keeping
  readonly unready: readonly SheetGroup[]
}

/** What the planner asks, what was given twice, what could not be kept, and what is missing. */
export function SheetNotices({ stored, keeping, unready }: SheetNoticesProps) {
  const { t } = useMessages()
  const { question } = stored.building
  const open = stored.conflicts.filter(({ state }) => state === 'open').length
  return (
    <>
      {question ? (
        <Notice tone="error" whatHappened={`${t('sheet.question')}: ${t('today.question', { question })}`} />
      ) : null}
      {open > 0 ? <Notice tone="attention" whatHappened={t('sheet.conflicts', { count: open })} /> : null}
      {keeping.kind === 'failed' ? (
        <Notice
          tone="error"
          urgent
          whatHappened={t('sheet.notKept', { reason: keeping.reason ?? '' })}
          whatIsSafe={t('sheet.notKeptSafe')}
          whatToDo={t('sheet.notKeptToDo')}
        />
      ) : null}
      {unready.length > 0 ? (
        <Notice
          tone="attention"
          urgent
          whatHappened={t('sheet.missing', {
            groups: unready.map((group) => t(`sheet.group.${group}`)).join(', '),
          })}
        />
      ) : null}
    </>
  )
}
