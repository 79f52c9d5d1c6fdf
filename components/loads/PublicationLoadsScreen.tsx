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
  const api = useApi()
  const [fleet, setFleet] = useState<Fleet>({ containerM3: 30, payloadT: 13 })
  const publications = useQuery(yardPublicationsQuery(api))
  const listed = publications.data?.find((publication) => publication.publicationId === publicationId)
  const isWithdrawn = listed !== undefined && listed.withdrawnAt !== null
  const loads = useQuery({
    ...loadsAheadQuery(api, publicationId, fleet),
    enabled: !publications.isPending && !isWithdrawn,
  })
  const publication = listed ?? loads.data?.publication
  const shown = isWithdrawn ? undefined : loads.data
  const isWaiting = !shown && !loads.error && !isWithdrawn
  return (
    <Screen
      title={publication?.title ?? t('loads.title')}
      subtitle={publication ? `${publication.districtName} · ${publication.roundName}` : undefined}
      onBack={onBack}
      width="full"
      aside={shown ? <LoadsBasis loads={shown} /> : undefined}
    >
      {isWithdrawn ? <Withdrawn publication={listed} /> : null}
      {loads.error && !isWithdrawn ? <ProblemNotice error={loads.error} onRetry={() => void loads.refetch()} /> : null}
      {shown ? (
        <>
          <FleetForm fleet={fleet} isCounting={loads.isFetching} onApply={setFleet} />
          <LoadsReport loads={shown} />
        </>
      ) : null}
      {isWaiting ? <AppText soft>{t('common.loading')}</AppText> : null}
      {publication ? <PublicationTitleBlock publication={publication} /> : null}
    </Screen>
  )
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
