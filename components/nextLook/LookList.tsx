import { csvText } from '@/components/ui/csvText'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { downloadText } from '@/components/ui/web/downloadText'
import type { NextLooksReply } from '@/shared/api/nextLook'
import { formatCount, formatShare } from '@/shared/format'
import { lookCsvRows } from './lookCsvRows'
import { lookReasonText } from './lookReasonText'

interface LookListProps {
  readonly ranked: NextLooksReply
  readonly fileName: string
}

/** The list itself, most telling first, each building with its reason in words. */
export function LookList({ ranked: { looks, beats }, fileName }: LookListProps) {
  const { t, locale } = useMessages()
  const names = new Map(beats.map(({ beatId, name }) => [beatId, name]))
  const beatNameOf = (beatId: string | null) => (beatId === null ? t('nextLook.noBeat') : (names.get(beatId) ?? ''))
  let soFar = 0
  const rows = looks.map((look, place) => ({ ...look, rank: place + 1, shareSoFar: (soFar += look.settleShare) }))
  return (
    <Panel title={t('nextLook.list')} note={t('nextLook.listHead')}>
      <DataTable
        label={t('nextLook.list')}
        rows={rows}
        rowKey={({ buildingId }) => buildingId}
        columns={[
          {
            key: 'rank',
            head: t('nextLook.rankHead'),
            cell: ({ rank }) => formatCount(rank, locale),
            sortBy: ({ rank }) => rank,
            align: 'right',
            minWidth: 56,
          },
          {
            key: 'building',
            head: t('nextLook.building'),
            cell: ({ label }) => label,
            sortBy: ({ label }) => label,
            weight: 2,
            minWidth: 150,
          },
          {
            key: 'why',
            head: t('nextLook.why'),
            cell: ({ reason, state }) => lookReasonText(reason, state !== 'to-do', t),
            sortBy: ({ reason }) => reason.narrows,
            weight: 2,
            minWidth: 190,
          },
          {
            key: 'beat',
            head: t('nextLook.beat'),
            cell: ({ beatId }) => beatNameOf(beatId),
            sortBy: ({ beatId }) => beatNameOf(beatId),
            minWidth: 110,
          },
          {
            key: 'state',
            head: t('nextLook.state'),
            cell: ({ state }) => (state === 'to-do' ? t('nextLook.toDo') : t(`vocabulary.state.${state}`)),
            sortBy: ({ state }) => state,
            minWidth: 110,
          },
          {
            key: 'area',
            head: t('nextLook.area'),
            cell: ({ floorAreaM2 }) => formatCount(floorAreaM2, locale),
            sortBy: ({ floorAreaM2 }) => floorAreaM2,
            align: 'right',
          },
          {
            key: 'share',
            head: t('nextLook.shareHead'),
            cell: ({ settleShare }) => formatShare(settleShare, locale),
            sortBy: ({ settleShare }) => settleShare,
            align: 'right',
          },
          {
            key: 'soFar',
            head: t('nextLook.cumulative'),
            cell: ({ shareSoFar }) => formatShare(shareSoFar, locale),
            align: 'right',
          },
        ]}
        onSaveCsv={() => downloadText(fileName, csvText(lookCsvRows(looks, beatNameOf)), 'text/csv')}
      />
    </Panel>
  )
}
