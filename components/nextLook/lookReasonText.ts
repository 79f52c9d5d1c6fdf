import type { LookReason } from '@/shared/compute/nextLook/nextLook'
import type { Messages } from '@/shared/messages/messages.types'

/** Why to look at a building, in words: "large, age not known". */
export function lookReasonText({ narrows, isLarge }: LookReason, isRecorded: boolean, t: Messages['t']): string {
  const missing = t(`nextLook.reason.${narrows}`)
  const reason = isRecorded ? t('nextLook.recordedBut', { reason: missing }) : missing
  return isLarge ? t('nextLook.large', { reason }) : reason
}
