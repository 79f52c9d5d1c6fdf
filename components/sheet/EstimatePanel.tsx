import { useMemo } from 'react'
import { Course } from '@/components/charts/Course'
import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import type { FieldStore } from '@/db/fieldStore.types'
import type { SheetAnswers } from '@/shared/schemas/sheet'
import { formatMass, formatMassRange } from '@/shared/format'
import { useStored } from '@/sync/react/FieldProvider'
import { estimateSheet } from './estimateSheet'

const readEdition = (store: FieldStore) => store.readEdition()

/** Tonnes at once, with the error, from the factor book on this phone. */
export function EstimatePanel({ answers }: { readonly answers: SheetAnswers }) {
  const { t, locale } = useMessages()
  const edition = useStored(readEdition)
  const estimate = useMemo(() => (edition ? estimateSheet(answers, edition) : null), [answers, edition])
  const stands = !answers.finding || answers.finding.kind === 'standing'
  const why = !stands ? 'sheet.nothingStands' : edition === null ? 'sheet.estimateNoBook' : 'sheet.estimateNone'
  return (
    <Panel title={t('sheet.estimate')} note={edition ? t('sheet.estimateNote') : undefined}>
      {estimate ? (
        <>
          <AppText kind="figure">
            {t('sheet.estimateAbout', { mass: formatMass(twoDigits(estimate.massKg), locale) })}
          </AppText>
          <AppText soft>
            {[
              formatMassRange(twoDigits(estimate.lowKg), twoDigits(estimate.highKg), locale),
              ...(estimate.narrowedBy ? [t('sheet.narrows', { answer: t(`sheet.group.${estimate.narrowedBy}`) })] : []),
            ].join(' · ')}
          </AppText>
          <Course parts={estimate.parts} rows={2} />
          <AppText soft size="small">
            {t('cautions.estimate')}
          </AppText>
        </>
      ) : (
        <AppText soft>{t(why)}</AppText>
      )}
    </Panel>
  )
}

/** A guess from the street bears two digits, no more. */
function twoDigits(massKg: number): number {
  return Number(massKg.toPrecision(2))
}
