import type { LookReason } from '@/shared/compute/nextLook/nextLook'
import type { Messages } from '@/shared/messages/messages.types'

/** Why to look at a building, in words: "large, age not known". */
export function lookReasonText({ narrows, isLarge }: LookReason, isRecorded: boolean, t: Messages['t']): string {
  const missing = t(`nextLook.reason.${narrows}`)
  const reason = isLarge ? t('nextLook.large', { reason: missing }) : missing
  return isRecorded ? t('nextLook.recordedBut', { reason }) : reason
}
