import { MaterialName } from '@/components/runs/MaterialName'
import { AppText } from '@/components/ui/AppText'
import { Badge } from '@/components/ui/Badge'
import { csvText } from '@/components/ui/csvText'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { downloadText } from '@/components/ui/web/downloadText'
import { formatMassFigure, formatVolume } from '@/shared/format'
import type { Inventory, InventoryLine } from '@/shared/schemas/listing'

interface InventoryTableProps {
  readonly inventory: Inventory
  readonly fileName: string
}

/** A building's materials by component: tonnes with their band, loose volume, code, and what only a test decides. */
export function InventoryTable({ inventory: { lines }, fileName }: InventoryTableProps) {
  const { t, locale } = useMessages()
  const tonnes = (massKg: number): string => formatMassFigure(massKg, locale, 't')
  const nameOf = ({ component }: InventoryLine): string =>
    component === 'whole' ? t('listed.whole') : t(`vocabulary.component.${component}`)
  return (
    <DataTable
      label={t('listed.inventory')}
      rows={lines}
      rowKey={({ material, component }) => `${material}/${component}`}
      pageSize={100}
      onSaveCsv={() => downloadText(fileName, csvText(inventoryCsvRows(lines)), 'text/csv')}
      columns={[
        {
          key: 'material',
          head: t('common.material'),
          cell: ({ material }) => <MaterialName material={material} />,
          sortBy: ({ material }) => t(`vocabulary.material.${material}`),
          weight: 2,
          minWidth: 140,
        },
        {
          key: 'component',
          head: t('listed.component'),
          cell: nameOf,
          sortBy: nameOf,
          weight: 2,
          minWidth: 110,
        },
        { key: 'low', head: t('loads.massLow'), align: 'right', cell: ({ massKg }) => tonnes(massKg.low) },
        {
          key: 'likely',
          head: t('loads.mass'),
          align: 'right',
          sortBy: ({ massKg }) => massKg.likely,
          cell: ({ massKg }) => (
            <AppText kind="number" weight="semibold" align="right">
              {tonnes(massKg.likely)}
            </AppText>
          ),
        },
        { key: 'high', head: t('loads.massHigh'), align: 'right', cell: ({ massKg }) => tonnes(massKg.high) },
        {
          key: 'volume',
          head: t('loads.volume'),
          align: 'right',
          cell: ({ looseVolumeM3 }) => formatVolume(looseVolumeM3, locale).replace(/\u00a0m³$/, ''),
        },
        { key: 'code', head: t('loads.code'), cell: ({ code }) => code, sortBy: ({ code }) => code },
        {
          key: 'ask',
          head: t('listed.test'),
          weight: 3,
          minWidth: 250,
          cell: ({ mustAsk, alternatives }) =>
            mustAsk ? (
              <Badge tone="attention" label={t('listed.mustAsk', { codes: alternatives.join(', ') })} />
            ) : (
              alternatives.join(', ')
            ),
        },
      ]}
    />
  )
}

/** The inventory for a CSV file with all digits, head first. */
export function inventoryCsvRows(lines: readonly InventoryLine[]): (string | number | null)[][] {
  return [
    [
      'material',
      'component',
      'mass_low_kg',
      'mass_likely_kg',
      'mass_high_kg',
      'loose_volume_m3',
      'waste_code',
      'codes_if_tested_otherwise',
      'suspicion',
    ],
    ...lines.map(({ material, component, massKg, looseVolumeM3, code, alternatives, mustAsk }) => [
      material,
      component,
      massKg.low,
      massKg.likely,
      massKg.high,
      looseVolumeM3,
      code,
      alternatives.join(' '),
      mustAsk ? 'have it sampled' : '',
    ]),
  ]
}
