import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import type { PhotoFault } from './usePhotoIntake'

/** Each photo that failed: what happened, what is safe, what to do. */
export function PhotoFaults({ faults }: { readonly faults: readonly PhotoFault[] }) {
  const { t } = useMessages()
  return faults.map((fault, place) =>
    fault.kind === 'too-many' ? (
      <Notice
        key={place}
        tone="attention"
        urgent
        whatHappened={t('sheet.photoLeftOut', { count: fault.count })}
        whatToDo={t('sheet.photoLeftOutToDo')}
      />
    ) : (
      <Notice
        key={place}
        tone="error"
        urgent
        whatHappened={t(HAPPENED[fault.kind], { reason: fault.reason })}
        whatIsSafe={t('sheet.photoFaultSafe')}
        whatToDo={t(TO_DO[fault.kind])}
      />
    ),
  )
}

const HAPPENED = {
  unreadable: 'sheet.photoFault',
  'not-kept': 'sheet.photoNotKept',
  'not-removed': 'sheet.photoNotRemoved',
} as const
const TO_DO = {
  unreadable: 'sheet.photoFaultToDo',
  'not-kept': 'sheet.photoNotKeptToDo',
  'not-removed': 'sheet.photoNotRemovedToDo',
} as const
