import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { useChosenRun } from '@/components/runs/useChosenRun'
import { AppText } from '@/components/ui/AppText'
import { Badge } from '@/components/ui/Badge'
import { Button } from '@/components/ui/Button'
import { DataTable } from '@/components/ui/DataTable'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Panel } from '@/components/ui/Panel'
import { Screen } from '@/components/ui/Screen'
import type { Publication } from '@/shared/api/publications'
import { formatDate } from '@/shared/format'
import { useApi } from '@/sync/react/SessionProvider'
import { publicationsQuery } from './publicationQueries'
import { PublishDialog } from './PublishDialog'
import { WithdrawDialog } from './WithdrawDialog'

/** What contractors were given, and the way to give and to take back. */
export function PublishScreen() {
  const { t } = useMessages()
  const publications = useQuery(publicationsQuery(useApi()))
  const runs = useChosenRun()
  const [isPublishing, setIsPublishing] = useState(false)
  const [leaving, setLeaving] = useState<Publication | null>(null)
  const hasRun = runs.finished.length > 0
  const publishButton = (
    <Button kind="primary" label={t('publish.publish')} disabled={!hasRun} onPress={() => setIsPublishing(true)} />
  )
  return (
    <Screen title={t('publish.title')} right={publishButton}>
      <AppText>{t('publish.lead')}</AppText>
      {runs.error ? <ProblemNotice error={runs.error} onRetry={runs.retry} /> : null}
      {!hasRun && !runs.isLoading && !runs.error ? <Notice tone="attention" whatHappened={t('publish.noRun')} /> : null}
      {publications.error ? (
        <ProblemNotice error={publications.error} onRetry={() => void publications.refetch()} />
      ) : null}
      {publications.isPending ? <AppText soft>{t('common.loading')}</AppText> : null}
      {publications.data ? (
        <Panel title={t('publish.list')}>
          <PublicationTable publications={publications.data} onWithdraw={setLeaving} />
        </Panel>
      ) : null}
      {isPublishing ? <PublishDialog finished={runs.finished} onClose={() => setIsPublishing(false)} /> : null}
      {leaving ? <WithdrawDialog publication={leaving} onClose={() => setLeaving(null)} /> : null}
    </Screen>
  )
}

interface PublicationTableProps {
  readonly publications: readonly Publication[]
  readonly onWithdraw: (publication: Publication) => void
}

function PublicationTable({ publications, onWithdraw }: PublicationTableProps) {
  const { t, locale } = useMessages()
  return (
    <DataTable
      label={t('publish.list')}
      rows={publications}
      rowKey={({ publicationId }) => publicationId}
      empty={<EmptyState title={t('publish.empty')} text={t('publish.emptyText')} />}
      columns={[
        {
          key: 'title',
          head: t('publish.name'),
          cell: ({ title }) => title,
          sortBy: ({ title }) => title,
          weight: 3,
          minWidth: 180,
        },
        {
          key: 'run',
          head: t('publish.run'),
          cell: ({ runNumber }) => String(runNumber),
          align: 'right',
          minWidth: 56,
        },
        {
          key: 'edition',
          head: t('publish.edition'),
          cell: ({ editionNumber }) => String(editionNumber),
          align: 'right',
          minWidth: 72,
        },
        {
          key: 'date',
          head: t('publish.date'),
          cell: ({ publishedAt, publishedByName }) => `${formatDate(publishedAt, locale)}, ${publishedByName}`,
          sortBy: ({ publishedAt }) => publishedAt,
          weight: 2,
          minWidth: 140,
        },
        {
          key: 'recipients',
          head: t('publish.recipients'),
          cell: ({ recipients }) => recipients.map(({ name, firm }) => firm ?? name).join(', '),
          weight: 2,
          minWidth: 140,
        },
        {
          key: 'state',
          head: t('publish.state'),
          cell: ({ withdrawnAt, withdrawalReason }) =>
            withdrawnAt === null ? (
              <Badge tone="good" label={t('publish.open')} />
            ) : (
              t('publish.withdrawnBecause', {
                date: formatDate(withdrawnAt, locale),
                reason: withdrawalReason ?? '',
              })
            ),
          weight: 2,
          minWidth: 160,
        },
        {
          key: 'act',
          head: t('common.act'),
          cell: (publication) =>
            publication.withdrawnAt === null ? (
              <Button
                kind="quiet"
                label={t('publish.withdraw')}
                accessibleLabel={t('publish.withdrawOf', { title: publication.title })}
                onPress={() => onWithdraw(publication)}
              />
            ) : null,
          minWidth: 120,
        },
      ]}
    />
  )
}
