import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Screen } from '@/components/ui/Screen'
import { TitleBlock } from '@/components/ui/TitleBlock'
import type { Publication } from '@/shared/api/publications'
import { formatDate } from '@/shared/format'
import { useApi } from '@/sync/react/SessionProvider'
import { FleetForm } from './FleetForm'
import { loadsAheadQuery, yardPublicationsQuery, type Fleet } from './loadQueries'
import { LoadsBasis } from './LoadsBasis'
import { LoadsReport } from './LoadsReport'

interface PublicationLoadsScreenProps {
  readonly publicationId: string
  readonly onBack: () => void
}

/** One publication: its loads counted in my vehicles, or why it was withdrawn. */
export function PublicationLoadsScreen({ publicationId, onBack }: PublicationLoadsScreenProps) {
  const { t } = useMessages()
  const publications = useQuery(yardPublicationsQuery(useApi()))
  const listed = publications.data?.find((publication) => publication.publicationId === publicationId)
  if (publications.isPending) {
    return (
      <Screen title={t('loads.title')} onBack={onBack}>
        <AppText soft>{t('common.loading')}</AppText>
      </Screen>
    )
  }
  if (listed && listed.withdrawnAt !== null) {
    return (
      <Screen title={listed.title} subtitle={placeOf(listed)} onBack={onBack}>
        <Withdrawn publication={listed} />
        <PublicationTitleBlock publication={listed} />
      </Screen>
    )
  }
  return <OpenPublication publicationId={publicationId} onBack={onBack} />
}

function OpenPublication({ publicationId, onBack }: PublicationLoadsScreenProps) {
  const { t } = useMessages()
  const [fleet, setFleet] = useState<Fleet>({ containerM3: 30, payloadT: 13 })
  const { data: loads, error, isFetching, refetch } = useQuery(loadsAheadQuery(useApi(), publicationId, fleet))
  return (
    <Screen
      title={loads?.publication.title ?? t('loads.title')}
      subtitle={loads ? placeOf(loads.publication) : undefined}
      onBack={onBack}
      width="full"
      aside={loads ? <LoadsBasis loads={loads} /> : undefined}
    >
      {error ? <ProblemNotice error={error} onRetry={() => void refetch()} /> : null}
      {loads ? (
        <>
          <FleetForm fleet={fleet} isCounting={isFetching} onApply={setFleet} />
          <LoadsReport loads={loads} />
          <PublicationTitleBlock publication={loads.publication} />
        </>
      ) : null}
      {!loads && !error ? <AppText soft>{t('common.loading')}</AppText> : null}
    </Screen>
  )
}

function placeOf({ districtName, roundName }: Publication): string {
  return `${districtName} · ${roundName}`
}

function Withdrawn({ publication }: { readonly publication: Publication }) {
  const { t, locale } = useMessages()
  return (
    <Notice
      whatHappened={t('loads.withdrawnTitle', {
        date: formatDate(publication.withdrawnAt ?? '', locale),
        reason: publication.withdrawalReason ?? '',
      })}
      whatToDo={t('loads.withdrawnDo')}
    />
  )
}

function PublicationTitleBlock({ publication }: { readonly publication: Publication }) {
  const { t, locale } = useMessages()
  return (
    <TitleBlock
      cells={[
        { label: t('common.titleBlock.run'), value: String(publication.runNumber) },
        {
          label: t('common.titleBlock.place'),
          value: `${publication.districtName} · ${publication.roundName}`,
          weight: 3,
        },
        { label: t('common.titleBlock.edition'), value: String(publication.editionNumber) },
        { label: t('common.titleBlock.by'), value: publication.publishedByName, weight: 2 },
        { label: t('common.titleBlock.date'), value: formatDate(publication.publishedAt, locale), weight: 2 },
      ]}
    />
  )
}
