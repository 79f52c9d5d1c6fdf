import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { View } from 'react-native'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { TextField } from '@/components/ui/TextField'
import { addFinding } from '@/shared/api/listings'
import { formatDate } from '@/shared/format'
import type { ListingPage } from '@/shared/schemas/listing'
import { useApi } from '@/sync/react/SessionProvider'
import { listedKeys, type ListedSide } from './listedQueries'

interface FindingsPanelProps {
  readonly side: ListedSide
  readonly listing: ListingPage
}

/** What contractors found on site: each sees their own, the planner all. */
export function FindingsPanel({ side, listing }: FindingsPanelProps) {
  const { t, locale } = useMessages()
  return (
    <Panel title={t('listed.findings')}>
      {listing.findings.length === 0 ? <AppText soft>{t('listed.noFinding')}</AppText> : null}
      <View role="list" aria-label={t('listed.findings')}>
        {listing.findings.map(({ findingId, byName, at, text }) => (
          <View key={findingId} role="listitem">
            <AppText>{text}</AppText>
            <AppText soft>{`${byName} · ${formatDate(at, locale)}`}</AppText>
          </View>
        ))}
      </View>
      {side === 'yard' ? <NewFinding listing={listing} /> : null}
    </Panel>
  )
}

function NewFinding({ listing: { listingId } }: { readonly listing: ListingPage }) {
  const { t } = useMessages()
  const api = useApi()
  const queries = useQueryClient()
  const [text, setText] = useState('')
  const add = useMutation({
    mutationFn: () => api.call(addFinding, { params: { listingId }, body: { text } }),
    onSuccess: (page) => {
      queries.setQueryData(listedKeys.one('yard', listingId), page)
      setText('')
    },
  })
  return (
    <>
      {add.error ? <ProblemNotice error={add.error} isSending /> : null}
      <TextField
        label={t('listed.newFinding')}
        hint={t('listed.newFindingHint')}
        value={text}
        onChange={setText}
        multiline
        maxLength={1000}
      />
      <Button
        label={t('listed.keepFinding')}
        busy={add.isPending}
        disabled={text.trim() === ''}
        onPress={() => add.mutate()}
      />
    </>
  )
}
