import { View, StyleSheet } from 'react-native'
import { Badge } from '@/components/ui/Badge'
import { csvText } from '@/components/ui/csvText'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { SPACE } from '@/components/ui/theme/tokens'
import { downloadText } from '@/components/ui/web/downloadText'
import type { QueueEntry } from '@/shared/api/review'
import { formatArea, formatDate } from '@/shared/format'
import { revisionLetter } from '@/shared/schemas/sheet'

interface QueueTableProps {
  readonly sheets: readonly QueueEntry[]
  readonly onOpen: (sheetId: string) => void
}

/** The queue as a table; a row opens its sheet. */
export function QueueTable({ sheets, onOpen }: QueueTableProps) {
  const { t, locale } = useMessages()
  const handleCsv = () =>
    downloadText(
      'review.csv',
      csvText([
        [
          'reference',
          'building',
          'state',
          'revision',
          'flags',
          'recorded_by',
          'recorded_at',
          'gross_floor_area_m2',
          'photos',
        ],
        ...sheets.map((sheet) => [
          sheet.reference,
          sheet.label,
          sheet.state,
          sheet.revision,
          sheet.flags.join(' '),
          sheet.recordedByName,
          sheet.recordedAt,
          sheet.grossFloorAreaM2,
          sheet.photoCount,
        ]),
      ]),
      'text/csv',
    )
  return (
    <DataTable
      label={t('review.queue')}
      rows={sheets}
      rowKey={(sheet) => sheet.sheetId}
      onPressRow={(sheet) => onOpen(sheet.sheetId)}
      rowLabel={(sheet) => t('review.openSheet', { label: sheet.label })}
      onSaveCsv={handleCsv}
      pageSize={50}
      columns={[
        {
          key: 'label',
          head: t('review.building'),
          weight: 2,
          cell: (sheet) => sheet.label,
          sortBy: (sheet) => sheet.label,
        },
        {
          key: 'flags',
          head: t('review.flags'),
          weight: 3,
          minWidth: 180,
          sortBy: (sheet) => -sheet.flags.length,
          cell: (sheet) => (
            <View style={styles.flags}>
              {sheet.flags.map((flag) => (
                <Badge key={flag} tone="attention" label={t(`review.flag.${flag}`)} />
              ))}
            </View>
          ),
        },
        { key: 'rev', head: t('review.revision'), cell: (sheet) => revisionLetter(sheet.revision) },
        {
          key: 'area',
          head: t('review.floorArea'),
          align: 'right',
          cell: (sheet) => (sheet.grossFloorAreaM2 === null ? '–' : formatArea(sheet.grossFloorAreaM2, locale)),
        },
        { key: 'photos', head: t('review.photos'), align: 'right', cell: (sheet) => String(sheet.photoCount) },
        { key: 'by', head: t('review.by'), cell: (sheet) => sheet.recordedByName },
        {
          key: 'at',
          head: t('review.at'),
          cell: (sheet) => formatDate(sheet.recordedAt, locale),
          sortBy: (sheet) => sheet.recordedAt,
        },
      ]}
    />
  )
}

const styles = StyleSheet.create({ flags: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.tight } })
