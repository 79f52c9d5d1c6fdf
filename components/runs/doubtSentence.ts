import { formatShare } from '@/shared/format'
import type { Messages } from '@/shared/messages/messages.types'
import { dominantCauses, type DoubtCause } from './dominantCauses'

/** The dominant cause of the variance as a sentence, with what would narrow it. */
export function doubtSentence(shares: Readonly<Record<DoubtCause, number>>, { t, locale }: Messages): string {
  const [first, second] = dominantCauses(shares)
  if (!first) return t('runs.doubtNone')
  const parts = {
    first: t(`runs.cause.${first.cause}`),
    firstShare: formatShare(first.share, locale),
    remedy: t(`runs.remedy.${first.cause}`),
  }
  if (!second) return t('runs.doubtOne', parts)
  return t('runs.doubt', {
    ...parts,
    second: t(`runs.cause.${second.cause}`),
    secondShare: formatShare(second.share, locale),
  })
}
