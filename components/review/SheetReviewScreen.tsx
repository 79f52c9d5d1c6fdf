import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { useLocalSearchParams, useRouter, type Href } from 'expo-router'
import { useEffect, useState } from 'react'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { Button } from '@/components/ui/Button'
import { IconButton } from '@/components/ui/IconButton'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Progress } from '@/components/ui/Progress'
import { Screen } from '@/components/ui/Screen'
import { useWide } from '@/components/ui/theme/useWide'
import { useToast } from '@/components/ui/Toast'
import { checkSheets, type ReviewSheet } from '@/shared/api/review'
import { useApi } from '@/sync/react/SessionProvider'
import { queueQuery, reviewKeys, sheetQuery } from './reviewQueries'
import { SendBackDialog } from './SendBackDialog'
import { SheetReviewBody } from './SheetReviewBody'

/** One sheet beside its photos and its place; A accepts, B sends back, J and K go on and back. */
export function SheetReviewScreen() {
  const { t } = useMessages()
  const router = useRouter()
  const { sheetId } = useLocalSearchParams<{ sheetId: string }>()
  const api = useApi()
  const sheet = useQuery(sheetQuery(api, sheetId))
  const queue = useQuery(queueQuery(api, { roundId: null, state: 'handed-in' }))
  const ids = queue.data?.sheets.map((entry) => entry.sheetId) ?? []
  const place = ids.indexOf(sheetId)
  const go = (step: number) => {
    const next = ids[place === -1 ? 0 : place + step]
    router.navigate((next && next !== sheetId ? `/review/${next}` : '/review') as Href)
  }
  return (
    <Screen
      title={sheet.data?.label ?? t('review.sheet')}
      subtitle={sheet.data ? `${sheet.data.reference} · ${t(`vocabulary.state.${sheet.data.state}`)}` : undefined}
      onBack={() => router.navigate('/review' as Href)}
      width="report"
      footer={
        sheet.data ? <ReviewActions sheet={sheet.data} onNext={() => go(1)} onPrevious={() => go(-1)} /> : undefined
      }
    >
      {sheet.isPending ? <Progress label={t('common.loading')} share={null} /> : null}
      {sheet.error ? <ProblemNotice error={sheet.error} onRetry={() => void sheet.refetch()} /> : null}
      {sheet.data ? <SheetReviewBody sheet={sheet.data} /> : null}
    </Screen>
  )
}

interface ReviewActionsProps {
  readonly sheet: ReviewSheet
  readonly onNext: () => void
  readonly onPrevious: () => void
}

function ReviewActions({ sheet, onNext, onPrevious }: ReviewActionsProps) {
  const { t } = useMessages()
  const api = useApi()
  const toast = useToast()
  const queries = useQueryClient()
  const isWide = useWide()
  const [isAsking, setAsking] = useState(false)
  const settle = async () => {
    await queries.invalidateQueries({ queryKey: reviewKeys.all })
    onNext()
  }
  const accept = useMutation({
    mutationFn: () => api.call(checkSheets, { body: { sheets: [{ sheetId: sheet.sheetId, change: sheet.change }] } }),
    onSuccess: async ({ changedMeanwhileIds }) => {
      if (changedMeanwhileIds.length > 0) {
        toast(t('review.changedMeanwhile'), 'attention')
        await queries.invalidateQueries({ queryKey: reviewKeys.all })
        return
      }
      toast(t('review.accepted', { count: 1 }), 'good')
      await settle()
    },
  })
  const keys = {
    a: () => accept.mutate(),
    b: () => setAsking(true),
    j: onNext,
    k: onPrevious,
    arrowright: onNext,
    arrowleft: onPrevious,
  }
  useReviewKeys(keys, !isAsking && !accept.isPending)
  return (
    <>
      {accept.error ? <ProblemNotice error={accept.error} isSending /> : null}
      <IconButton icon="back" label={t('review.previous')} onPress={onPrevious} framed />
      <Button
        kind="secondary"
        label={isWide ? t('review.sendBackKey') : t('review.sendBack')}
        onPress={() => setAsking(true)}
        grow
      />
      <Button
        kind="primary"
        label={isWide ? t('review.acceptKey') : t('review.accept')}
        onPress={() => accept.mutate()}
        busy={accept.isPending}
        grow
      />
      <IconButton icon="forward" label={t('review.next')} onPress={onNext} framed />
      {isAsking ? <SendBackDialog sheet={sheet} onClose={() => setAsking(false)} onSent={() => void settle()} /> : null}
    </>
  )
}

/** Single keys act, but never while something is typed. */
function useReviewKeys(actions: Readonly<Record<string, () => void>>, isOn: boolean): void {
  useEffect(() => {
    if (!isOn) return
    const hear = (event: KeyboardEvent) => {
      const typedInto = event.target instanceof HTMLElement && /^(INPUT|TEXTAREA|SELECT)$/.test(event.target.tagName)
      if (typedInto || event.repeat || event.ctrlKey || event.metaKey || event.altKey) return
      actions[event.key.toLowerCase()]?.()
    }
    globalThis.addEventListener?.('keydown', hear)
    return () => globalThis.removeEventListener?.('keydown', hear)
  })
}
