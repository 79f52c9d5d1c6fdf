import { useMessages } from '@/components/ui/MessagesProvider'
import { TitleBlock } from '@/components/ui/TitleBlock'
import { formatDate } from '@/shared/format'
import type { RunSummary } from '@/shared/schemas/run'

/** Which run this is, at the foot of everything made of it. */
export function RunTitleBlock({ run }: { readonly run: RunSummary }) {
  const { t, locale } = useMessages()
  return (
    <TitleBlock
      cells={[
        { label: t('common.titleBlock.run'), value: String(run.number) },
        { label: t('common.titleBlock.place'), value: `${run.districtName} · ${run.roundName}`, weight: 3 },
        { label: t('common.titleBlock.edition'), value: String(run.editionNumber) },
        { label: t('common.titleBlock.by'), value: run.createdByName, weight: 2 },
        { label: t('common.titleBlock.date'), value: formatDate(run.createdAt, locale), weight: 2 },
        ...(run.resultSha256 === null
          ? []
          : [{ label: t('runs.digest'), value: run.resultSha256.slice(0, 12), weight: 2 }]),
      ]}
    />
  )
}
