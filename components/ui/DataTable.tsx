import { useId, useState, type ReactNode } from 'react'
import { Pressable, ScrollView, StyleSheet, View } from 'react-native'
import { AppText } from './AppText'
import { Button } from './Button'
import { Icon } from './Icon'
import { useMessages } from './MessagesProvider'
import { sortRows, type SortOrder } from './sortRows'
import { useTheme } from './theme/ThemeProvider'
import { SPACE, TARGET } from './theme/tokens'
import { webOnly } from './web/webOnly'

/** One column of a table. */
export interface Column<Row> {
  readonly key: string
  readonly head: string
  /** A text is set in the table's type (tabular figures when aligned right); anything else is drawn as it is. */
  readonly cell: (row: Row) => ReactNode
  /** Numbers stand at the right. */
  readonly align?: 'left' | 'right'
  /** Makes the column sortable. Null sorts last. */
  readonly sortBy?: (row: Row) => string | number | null
  /** Share of the width against the other columns; 1 when left out. */
  readonly weight?: number
  /** Least width [px]; 88 when left out. Together they decide when the table scrolls sideways. */
  readonly minWidth?: number
}

export interface DataTableProps<Row> {
  /** Name of the table, for screen readers and over it when `showLabel`. */
  readonly label: string
  readonly showLabel?: boolean
  readonly columns: readonly Column<Row>[]
  readonly rows: readonly Row[]
  readonly rowKey: (row: Row) => string
  /** Offers "Save as CSV" under the table. */
  readonly onSaveCsv?: () => void
  /** Opens the receipt or the thing behind a row. */
  readonly onPressRow?: (row: Row) => void
  /** What a screen reader says of that: "Open Tar Lane 12". */
  readonly rowLabel?: (row: Row) => string
  readonly selectedKey?: string | null
  /** Last row, in bold: the totals. Cells by column key. */
  readonly totals?: Readonly<Record<string, string>>
  /** What stands there when there are no rows. */
  readonly empty?: ReactNode
  /** Rows drawn at first and at each "Show more"; 100 when left out. */
  readonly pageSize?: number
}

/** A table that is one to screen readers as well: ruled by hairlines, figures one under the other. */
export function DataTable<Row>(props: DataTableProps<Row>) {
  const { label, columns, rows, rowKey, pageSize = 100, totals, empty } = props
  const { colours } = useTheme()
  const labelId = useId()
  const [order, setOrder] = useState<SortOrder | null>(null)
  const [shownCount, setShownCount] = useState(pageSize)
  const [widthPx, setWidthPx] = useState(0)
  const [contentPx, setContentPx] = useState(0)
  if (rows.length === 0 && empty) return <>{empty}</>

  const sortBy = columns.find((column) => column.key === order?.key)?.sortBy
  const sorted = sortBy && order ? sortRows(rows, sortBy, order.direction) : rows
  const leastWidth = columns.reduce((width, { minWidth = 88 }) => width + minWidth, 0)
  return (
    <View style={styles.block}>
      {props.showLabel ? (
        <AppText kind="heading" level={3} id={labelId}>
          {label}
        </AppText>
      ) : null}
      <ScrollView
        horizontal
        contentContainerStyle={styles.wide}
        onLayout={(event) => setWidthPx(event.nativeEvent.layout.width)}
        onContentSizeChange={setContentPx}
        {...webOnly({
          dataSet: { printFlow: '' },
          ...(Math.max(contentPx, leastWidth) > widthPx ? { tabIndex: 0 } : {}),
        })}
      >
        <View
          role="table"
          {...(props.showLabel ? { 'aria-labelledby': labelId } : { 'aria-label': label })}
          {...webOnly({ 'aria-rowcount': rows.length + 1, 'aria-colcount': columns.length })}
          style={[styles.table, { minWidth: leastWidth }]}
        >
          <View role="rowgroup">
            <View role="row" style={[styles.row, styles.headRow, { borderColor: colours.rule }]}>
              {columns.map((column) => (
                <HeadCell key={column.key} column={column} order={order} onOrder={setOrder} />
              ))}
            </View>
          </View>
          <View role="rowgroup">
            {sorted.slice(0, shownCount).map((row) => (
              <BodyRow key={rowKey(row)} row={row} table={props} />
            ))}
            {totals ? (
              <View role="row" style={[styles.row, styles.totals, { borderColor: colours.rule }]}>
                {columns.map((column) => (
                  <View key={column.key} role="cell" style={cellStyle(column)}>
                    <AppText kind="number" weight="semibold" align={column.align}>
                      {totals[column.key] ?? ''}
                    </AppText>
                  </View>
                ))}
              </View>
            ) : null}
          </View>
        </View>
      </ScrollView>
      <Foot
        label={label}
        hiddenCount={rows.length - shownCount}
        pageSize={pageSize}
        onMore={() => setShownCount(shownCount + pageSize)}
        onSaveCsv={props.onSaveCsv}
      />
    </View>
  )
}

interface FootProps {
  readonly label: string
  readonly hiddenCount: number
  readonly pageSize: number
  readonly onMore: () => void
  readonly onSaveCsv?: () => void
}

function Foot({ label, hiddenCount, pageSize, onMore, onSaveCsv }: FootProps) {
  const { t } = useMessages()
  if (hiddenCount <= 0 && !onSaveCsv) return null
  return (
    <View style={styles.foot} {...webOnly({ dataSet: { printHide: '' } })}>
      {hiddenCount > 0 ? (
        <Button
          kind="quiet"
          label={t('common.showMore', { count: Math.min(pageSize, hiddenCount) })}
          onPress={onMore}
        />
      ) : (
        <View />
      )}
      {onSaveCsv ? (
        <Button
          kind="quiet"
          icon="download"
          label={t('common.saveAsCsv')}
          accessibleLabel={`${t('common.saveAsCsv')}: ${label}`}
          onPress={onSaveCsv}
        />
      ) : null}
    </View>
  )
}

interface HeadCellProps<Row> {
  readonly column: Column<Row>
  readonly order: SortOrder | null
  readonly onOrder: (order: SortOrder) => void
}

function HeadCell<Row>({ column, order, onOrder }: HeadCellProps<Row>) {
  const { t } = useMessages()
  const direction = order?.key === column.key ? order.direction : null
  const head = (
    <AppText kind="label" weight="semibold" align={column.align}>
      {column.head}
    </AppText>
  )
  if (!column.sortBy) {
    return (
      <View role="columnheader" style={cellStyle(column)}>
        {head}
      </View>
    )
  }
  return (
    <View
      role="columnheader"
      {...webOnly({ 'aria-sort': direction === null ? 'none' : direction === 'up' ? 'ascending' : 'descending' })}
      style={[cellStyle(column), styles.flushCell]}
    >
      <Pressable
        role="button"
        aria-label={t('common.sortBy', { column: column.head })}
        onPress={() =>
          onOrder({
            key: column.key,
            direction: nextDirection(direction, column.align),
          })
        }
        {...webOnly({ dataSet: { insetFocus: '' } })}
        style={[styles.sorter, column.align === 'right' && styles.sorterRight]}
      >
        {head}
        <Icon name={direction === 'up' ? 'up' : 'down'} size={direction === null ? 12 : 16} />
      </Pressable>
    </View>
  )
}

function nextDirection(
  direction: SortOrder['direction'] | null,
  align: Column<unknown>['align'],
): SortOrder['direction'] {
  if (direction !== null) return direction === 'up' ? 'down' : 'up'
  return align === 'right' ? 'down' : 'up'
}

interface BodyRowProps<Row> {
  readonly row: Row
  readonly table: DataTableProps<Row>
}

function BodyRow<Row>({ row, table }: BodyRowProps<Row>) {
  const { columns, rowKey, onPressRow, rowLabel, selectedKey } = table
  const { colours } = useTheme()
  const isSelected = selectedKey === rowKey(row)
  const cells = columns.map((column, place) => {
    const content = column.cell(row)
    const drawn =
      typeof content === 'string' || typeof content === 'number' ? (
        <AppText kind="number" align={column.align} weight={isSelected ? 'semibold' : undefined}>
          {content}
        </AppText>
      ) : (
        content
      )
    const opens = onPressRow && place === 0
    return (
      <View key={column.key} role="cell" style={cellStyle(column)}>
        {opens ? (
          <Pressable
            role="button"
            aria-label={rowLabel?.(row)}
            onPress={() => onPressRow(row)}
            {...webOnly({ 'aria-pressed': isSelected, dataSet: { insetFocus: '' } })}
            style={styles.opener}
          >
            {drawn}
          </Pressable>
        ) : (
          drawn
        )}
      </View>
    )
  })
  return (
    <View
      role="row"
      {...webOnly({
        onClick: onPressRow ? () => onPressRow(row) : undefined,
        dataSet: onPressRow ? { hover: '', motion: '' } : {},
      })}
      style={[
        styles.row,
        { borderColor: colours.hairline },
        onPressRow && styles.pressable,
        onPressRow && webOnly({ cursor: 'pointer' }),
        isSelected && { backgroundColor: colours.sunken },
      ]}
    >
      {cells}
    </View>
  )
}

function cellStyle<Row>({ weight = 1, minWidth = 88, align }: Column<Row>) {
  return [styles.cell, { flexGrow: weight, minWidth }, align === 'right' && styles.right]
}

const styles = StyleSheet.create({
  block: { gap: SPACE.small },
  wide: { flexGrow: 1 },
  table: { flexGrow: 1 },
  row: { flexDirection: 'row', alignItems: 'center', borderBottomWidth: 1, minHeight: 40 },
  pressable: { minHeight: TARGET },
  headRow: { borderBottomWidth: 1.5 },
  totals: { borderTopWidth: 1.5, borderBottomWidth: 0 },
  cell: { flexBasis: 0, paddingHorizontal: SPACE.small, paddingVertical: SPACE.small },
  flushCell: { paddingVertical: 0 },
  right: { alignItems: 'stretch' },
  sorter: {
    minHeight: TARGET,
    flexDirection: 'row',
    alignItems: 'center',
    gap: SPACE.tight,
    marginHorizontal: -SPACE.small,
    paddingHorizontal: SPACE.small,
  },
  sorterRight: { flexDirection: 'row-reverse' },
  opener: { minHeight: TARGET - SPACE.large, justifyContent: 'center' },
  foot: { flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'space-between', gap: SPACE.small },
})
