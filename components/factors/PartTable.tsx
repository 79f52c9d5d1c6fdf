import { AppText } from '@/components/ui/AppText'
import { csvText } from '@/components/ui/csvText'
import { DataTable, type Column } from '@/components/ui/DataTable'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { downloadText } from '@/components/ui/web/downloadText'
import { factorCsvRows } from './factorCsvRows'

type Flat<Row> = { readonly [Field in keyof Row]: string | number | boolean | null }

interface PartTableProps<Row> {
  readonly title: string
  readonly note?: string
  readonly rows: readonly Row[]
  readonly columns: readonly Column<Row>[]
  readonly fileName: string
  /** In a draft: opens a row to change it. */
  readonly onChange?: ((row: Row) => void) | undefined
}

/** One part of an edition as a table. */
export function PartTable<Row extends Flat<Row> & { readonly rowId: string }>(props: PartTableProps<Row>) {
  const { title, note, rows, columns, fileName, onChange } = props
  const { t } = useMessages()
  return (
    <Panel title={title} note={t('factorBook.count', { count: rows.length })}>
      {note ? <AppText soft>{note}</AppText> : null}
      <DataTable
        label={title}
        rows={rows}
        rowKey={({ rowId }) => rowId}
        columns={columns}
        {...(onChange ? { onPressRow: onChange, rowLabel: () => t('factorBook.changeRowTitle', { part: title }) } : {})}
        empty={<EmptyState title={t('factorBook.noRows')} />}
        onSaveCsv={() => downloadText(fileName, csvText(factorCsvRows(rows)), 'text/csv')}
      />
    </Panel>
  )
}
