import { useQuery } from '@tanstack/react-query'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Badge } from '@/components/ui/Badge'
import { DataTable } from '@/components/ui/DataTable'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Screen } from '@/components/ui/Screen'
import { formatDate } from '@/shared/format'
import { useApi } from '@/sync/react/SessionProvider'
import { yardPublicationsQuery } from './loadQueries'

/** What planners have published to me. */
export function LoadsAheadScreen({ onOpen }: { readonly onOpen: (publicationId: string) => void }) {
  const { t, locale } = useMessages()
  const publications = useQuery(yardPublicationsQuery(useApi()))
  return (
    <Screen title={t('loads.title')}>
      <AppText>{t('loads.lead')}</AppText>
      {publications.error ? (
        <ProblemNotice error={publications.error} onRetry={() => void publications.refetch()} />
      ) : null}
      {publications.isPending ? <AppText soft>{t('common.loading')}</AppText> : null}
      {publications.data ? (
        <Panel title={t('loads.list')}>
          <DataTable
            label={t('loads.list')}
            rows={publications.data}
            rowKey={({ publicationId }) => publicationId}
            onPressRow={({ publicationId }) => onOpen(publicationId)}
            rowLabel={({ title }) => t('loads.openOf', { title })}
            empty={<EmptyState title={t('loads.empty')} text={t('loads.emptyText')} />}
            columns={[
              {
                key: 'title',
                head: t('loads.name'),
                cell: ({ title }) => title,
                sortBy: ({ title }) => title,
                weight: 3,
                minWidth: 180,
              },
              {
                key: 'district',
                head: t('loads.district'),
                cell: ({ districtName }) => districtName,
                sortBy: ({ districtName }) => districtName,
                weight: 2,
                minWidth: 110,
              },
              {
                key: 'surveyYear',
                head: t('loads.surveyYear'),
                cell: ({ surveyYear }) => String(surveyYear),
                sortBy: ({ surveyYear }) => surveyYear,
              },
              {
                key: 'date',
                head: t('loads.date'),
                cell: ({ publishedAt }) => formatDate(publishedAt, locale),
                sortBy: ({ publishedAt }) => publishedAt,
                weight: 2,
                minWidth: 120,
              },
              {
                key: 'state',
                head: t('loads.state'),
                cell: ({ withdrawnAt, withdrawalReason }) =>
                  withdrawnAt === null ? (
                    <Badge tone="good" label={t('loads.open')} />
                  ) : (
                    <AppText kind="number" tone="error">
                      {t('loads.withdrawnBecause', { reason: withdrawalReason ?? '' })}
                    </AppText>
                  ),
                weight: 2,
                minWidth: 140,
              },
            ]}
          />
        </Panel>
      ) : null}
    </Screen>
  )
}
