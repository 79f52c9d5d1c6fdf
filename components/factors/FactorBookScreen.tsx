import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Badge } from '@/components/ui/Badge'
import { Button } from '@/components/ui/Button'
import { DataTable } from '@/components/ui/DataTable'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Screen } from '@/components/ui/Screen'
import { TitleBlock } from '@/components/ui/TitleBlock'
import { formatDate } from '@/shared/format'
import type { Edition } from '@/shared/schemas/factorBook'
import { useApi } from '@/sync/react/SessionProvider'
import { DraftTools } from './DraftTools'
import { EditionParts } from './EditionParts'
import { editionQuery, editionsQuery } from './factorQueries'
import { NewDraftDialog } from './NewDraftDialog'

interface FactorBookScreenProps {
  /** The edition of the address; the newest one when there is none. */
  readonly editionId: string | null
  readonly onChoose: (editionId: string) => void
}

/** The editions of the factor book, and the rows of the chosen one with their sources. */
export function FactorBookScreen({ editionId, onChoose }: FactorBookScreenProps) {
  const { t } = useMessages()
  const editions = useQuery(editionsQuery(useApi()))
  const [isDrafting, setDrafting] = useState(false)
  const chosen = editions.data?.find((edition) => edition.editionId === editionId) ?? editions.data?.[0]
  return (
    <Screen title={t('factorBook.title')} width="full">
      <AppText>{t('factorBook.lead')}</AppText>
      {editions.error ? <ProblemNotice error={editions.error} onRetry={() => void editions.refetch()} /> : null}
      {editions.isPending ? <AppText soft>{t('common.loading')}</AppText> : null}
      {editions.data ? (
        <Panel
          title={t('factorBook.editions')}
          action={<Button kind="secondary" label={t('factorBook.newDraft')} onPress={() => setDrafting(true)} />}
        >
          <EditionTable editions={editions.data} chosenId={chosen?.editionId ?? null} onChoose={onChoose} />
        </Panel>
      ) : null}
      {chosen ? <ChosenEdition key={chosen.editionId} edition={chosen} /> : null}
      {isDrafting && editions.data ? (
        <NewDraftDialog
          editions={editions.data}
          fromId={chosen?.editionId ?? null}
          onClose={() => setDrafting(false)}
          onMade={onChoose}
        />
      ) : null}
    </Screen>
  )
}

interface EditionTableProps {
  readonly editions: readonly Edition[]
  readonly chosenId: string | null
  readonly onChoose: (editionId: string) => void
}

function EditionTable({ editions, chosenId, onChoose }: EditionTableProps) {
  const { t, locale } = useMessages()
  return (
    <DataTable
      label={t('factorBook.editions')}
      rows={editions}
      rowKey={({ editionId }) => editionId}
      selectedKey={chosenId}
      onPressRow={({ editionId }) => onChoose(editionId)}
      rowLabel={({ number }) => t('factorBook.open', { number })}
      empty={<EmptyState title={t('factorBook.empty')} text={t('factorBook.emptyText')} />}
      columns={[
        { key: 'number', head: t('factorBook.number'), cell: ({ number }) => String(number), minWidth: 72 },
        { key: 'name', head: t('factorBook.name'), cell: ({ name }) => name, weight: 3, minWidth: 160 },
        {
          key: 'state',
          head: t('factorBook.state'),
          cell: ({ state }) => (
            <Badge tone={state === 'issued' ? 'good' : 'attention'} label={t(`factorBook.${state}`)} />
          ),
        },
        {
          key: 'issuedAt',
          head: t('factorBook.issuedAt'),
          cell: ({ issuedAt }) => (issuedAt === null ? '' : formatDate(issuedAt, locale)),
          minWidth: 120,
        },
        { key: 'by', head: t('factorBook.issuedBy'), cell: ({ issuedByName }) => issuedByName ?? '' },
      ]}
    />
  )
}

function ChosenEdition({ edition }: { readonly edition: Edition }) {
  const { t, locale } = useMessages()
  const full = useQuery(editionQuery(useApi(), edition.editionId))
  return (
    <>
      {full.error ? <ProblemNotice error={full.error} onRetry={() => void full.refetch()} /> : null}
      {full.isPending ? <AppText soft>{t('common.loading')}</AppText> : null}
      {edition.note ? <AppText>{t('factorBook.noteOfEdition', { note: edition.note })}</AppText> : null}
      {full.data?.state === 'draft' ? <DraftTools edition={full.data} /> : null}
      {full.data ? <EditionParts edition={full.data} /> : null}
      <TitleBlock
        cells={[
          { label: t('common.titleBlock.edition'), value: String(edition.number) },
          { label: t('factorBook.name'), value: edition.name, weight: 3 },
          { label: t('common.titleBlock.by'), value: edition.issuedByName ?? t('factorBook.draft'), weight: 2 },
          {
            label: t('common.titleBlock.date'),
            value: edition.issuedAt === null ? t('factorBook.draft') : formatDate(edition.issuedAt, locale),
            weight: 2,
          },
        ]}
      />
    </>
  )
}
