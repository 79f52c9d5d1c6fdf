import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import type { NextLooksReply } from '@/shared/api/nextLook'
import { massBand } from '@/shared/compute/run/massBand'
import { formatCount, formatMass, formatMassRange, formatShare } from '@/shared/format'
import { lookFigureText } from './lookFigureText'

/** The figure over the whole frame, how sure it is, and what of the doubt looking can settle. */
export function NowPanel({ ranked }: { readonly ranked: NextLooksReply }) {
  const { t, locale } = useMessages()
  const { figure, meanKg, varianceKg2, varianceShares, frameCount, recordedCount, looks, run } = ranked
  const { p10Kg, p90Kg } = massBand(meanKg, varianceKg2)
  const settled = looks.reduce((share, { fallShare }) => share + fallShare, 0)
  return (
    <Panel title={t('nextLook.now')} note={lookFigureText(figure, t)}>
      <AppText kind="figure" size="figure">
        {formatMass(meanKg, locale)}
      </AppText>
      <AppText>
        {t('nextLook.nowBand', {
          range: formatMassRange(p10Kg, p90Kg, locale),
          frame: formatCount(frameCount, locale),
          recorded: formatCount(recordedCount, locale),
        })}
      </AppText>
      <AppText>
        {t('nextLook.settles', {
          share: formatShare(settled, locale),
          factor: formatShare(varianceShares.factor, locale),
          lifetime: formatShare(varianceShares.lifetime, locale),
        })}
      </AppText>
      {settled < varianceShares.factor ? <AppText tone="attention">{t('nextLook.betterFactors')}</AppText> : null}
      <AppText soft>
        {t('nextLook.nowBasis', { edition: String(run.editionNumber), run: String(run.number) })}
        {run.isOfRound ? '' : ` ${t('nextLook.otherRound')}`}
      </AppText>
    </Panel>
  )
}
