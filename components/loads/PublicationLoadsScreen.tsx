import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Screen } from '@/components/ui/Screen'
import { TitleBlock } from '@/components/ui/TitleBlock'
import { useToast } from '@/components/ui/Toast'
import type { Publication } from '@/shared/api/publications'
import { saveYardPlan } from '@/shared/api/yard'
import { formatDate } from '@/shared/format'
import type { YardPlan } from '@/shared/schemas/yardPlan'
import { useApi } from '@/sync/react/SessionProvider'
import { loadsAheadQuery, yardPlanQuery, yardPublicationsQuery } from './loadQueries'
import { LoadsBasis } from './LoadsBasis'
import { LoadsReport } from './LoadsReport'
import { PlantForm } from './PlantForm'

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

function OpenPublication(props: PublicationLoadsScreenProps) {
  const { t } = useMessages()
  const plan = useQuery(yardPlanQuery(useApi()))
  if (plan.data) return <PlannedLoads {...props} plan={plan.data} />
  return (
    <Screen title={t('loads.title')} onBack={props.onBack}>
      {plan.error ? <ProblemNotice error={plan.error} onRetry={() => void plan.refetch()} /> : null}
      {plan.isPending ? <AppText soft>{t('common.loading')}</AppText> : null}
    </Screen>
  )
}

function PlannedLoads({ publicationId, onBack, plan }: PublicationLoadsScreenProps & { readonly plan: YardPlan }) {
  const { t } = useMessages()
  const api = useApi()
  const queries = useQueryClient()
  const toast = useToast()
  const { containerM3, payloadT } = plan
  const {
    data: loads,
    error,
    isFetching,
    refetch,
  } = useQuery(loadsAheadQuery(api, publicationId, { containerM3, payloadT }))
  const keep = useMutation({
    mutationFn: (wanted: YardPlan) => api.call(saveYardPlan, { body: wanted }),
    onSuccess: (kept) => {
      queries.setQueryData(yardPlanQuery(api).queryKey, kept)
      toast(t('loads.planKept'), 'good')
    },
  })
  return (
    <Screen
      title={loads?.publication.title ?? t('loads.title')}
      subtitle={loads ? placeOf(loads.publication) : undefined}
      onBack={onBack}
      width="full"
      aside={loads ? <LoadsBasis loads={loads} /> : undefined}
    >
      {error ? <ProblemNotice error={error} onRetry={() => void refetch()} /> : null}
      {keep.error ? <ProblemNotice error={keep.error} isSending /> : null}
      {loads ? (
        <>
          <PlantForm plan={plan} isCounting={isFetching || keep.isPending} onKeep={keep.mutate} />
          <LoadsReport loads={loads} plan={plan} isKeeping={keep.isPending} onKeep={keep.mutate} />
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
