import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import type { LoadsAhead } from '@/shared/api/publications'
import { formatCount, formatDecimal, formatShare } from '@/shared/format'

/** What a contractor must know of the figures: cautions first, then what they rest on. */
export function LoadsBasis({ loads }: { readonly loads: LoadsAhead }) {
  const { t, locale } = useMessages()
  const { basis, publication } = loads
  return (
    <>
      <Panel title={t('loads.cautions')} tone="attention">
        <AppText>{t('loads.cautionEstimate')}</AppText>
        <AppText>{t('loads.cautionHazard')}</AppText>
        <AppText>{t('loads.cautionMirror')}</AppText>
        <AppText>{t('loads.cautionGroup')}</AppText>
      </Panel>
      <Panel title={t('loads.basis')}>
        <AppText>
          {t('loads.basisCoverage', {
            computed: formatCount(basis.computedCount, locale),
            frame: formatCount(basis.frameCount, locale),
            share: formatShare(basis.frameCount > 0 ? basis.computedCount / basis.frameCount : 0, locale),
          })}
        </AppText>
        <AppText>
          {t('loads.basisRate', {
            rate: `${formatDecimal(basis.impliedDemolitionRatePerYear * 100, locale, 2)}\u00a0%`,
          })}
        </AppText>
        <AppText>
          {t('loads.basisEngine', {
            version: basis.engineVersion,
            offset: formatDecimal(basis.yearOffset, locale, 1),
            year: publication.surveyYear,
            edition: publication.editionNumber,
          })}
        </AppText>
        <AppText>{t('loads.basisRange')}</AppText>
      </Panel>
    </>
  )
}
