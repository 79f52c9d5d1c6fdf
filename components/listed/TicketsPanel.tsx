import { useMutation, useQueryClient } from '@tanstack/react-query'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { FileButton } from '@/components/ui/FileButton'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { useToast } from '@/components/ui/Toast'
import { giveTickets } from '@/shared/api/listings'
import type { ListingPage } from '@/shared/schemas/listing'
import { useApi } from '@/sync/react/SessionProvider'
import { listedKeys } from './listedQueries'

/** Gives the weighbridge tickets of the demolition, and says row by row what could not be read. */
export function TicketsPanel({ listing: { listingId } }: { readonly listing: ListingPage }) {
  const { t } = useMessages()
  const api = useApi()
  const queries = useQueryClient()
  const toast = useToast()
  const give = useMutation({
    mutationFn: async (file: File) =>
      api.call(giveTickets, { params: { listingId }, body: { csv: await file.text() } }),
    onSuccess: (page) => {
      queries.setQueryData(listedKeys.one('yard', listingId), page)
      toast(t('listed.ticketsTaken'), 'good')
    },
  })
  return (
    <Panel title={t('listed.giveTickets')}>
      <AppText soft>{t('listed.ticketsLead')}</AppText>
      {give.error ? <ProblemNotice error={give.error} isSending /> : null}
      <FileButton
        label={t('listed.chooseTickets')}
        accept=".csv,text/csv"
        busy={give.isPending}
        onFiles={([file]) => file && give.mutate(file)}
      />
    </Panel>
  )
}
