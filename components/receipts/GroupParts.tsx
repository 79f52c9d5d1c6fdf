import { useRouter } from 'expo-router'
import { AppText } from '@/components/ui/AppText'
import { csvText } from '@/components/ui/csvText'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { downloadText } from '@/components/ui/web/downloadText'
import { formatCount, formatMassFigure, formatShare, massUnitFor } from '@/shared/format'
import type { Receipt } from '@/shared/schemas/receipt'
import { groupName, periodName } from './receiptNames'
import { receiptHref } from './receiptHref'

/** A figure by use, structure and period; each group opens its own receipt, which ends at the buildings. */
export function GroupParts({ receipt }: { readonly receipt: Receipt }) {
  const { t, locale } = useMessages()
  const router = useRouter()
  const { groups, massKg, run, figure } = receipt
  const unit = massUnitFor([massKg])
  const total = (value: (group: Receipt['groups'][number]) => number) =>
    groups.reduce((all, group) => all + value(group), 0)
  return (
    <Panel title={t('receipts.groups')}>
      <DataTable
        label={t('receipts.groups')}
        rows={groups}
        rowKey={(group) => groupName(group, t)}
        rowLabel={(group) => t('receipts.openGroup', { group: groupName(group, t) })}
        onPressRow={({ use, structure, period }) =>
          router.push(receiptHref({ ...figure, runId: run.runId, use, structure, period }))
        }
        columns={[
          {
            key: 'use',
            head: t('receipts.use'),
            cell: ({ use }) => t(`vocabulary.use.${use}`),
            sortBy: ({ use }) => use,
            minWidth: 120,
          },
          {
            key: 'structure',
            head: t('receipts.structure'),
            cell: ({ structure }) => t(`vocabulary.structure.${structure}`),
            sortBy: ({ structure }) => structure,
            weight: 2,
            minWidth: 150,
          },
          {
            key: 'period',
            head: t('receipts.period'),
            cell: ({ period }) => periodName(period, t),
            sortBy: ({ period }) => period,
            minWidth: 100,
          },
          {
            key: 'count',
            head: t('receipts.buildings'),
            cell: ({ buildingCount }) => formatCount(buildingCount, locale),
            sortBy: ({ buildingCount }) => buildingCount,
            align: 'right',
          },
          {
            key: 'area',
            head: t('receipts.floorArea'),
            cell: ({ floorAreaM2 }) => formatCount(floorAreaM2, locale),
            sortBy: ({ floorAreaM2 }) => floorAreaM2,
            align: 'right',
          },
          {
            key: 'mass',
            head: t('receipts.mass', { unit }),
            cell: (group) => formatMassFigure(group.massKg, locale, unit),
            sortBy: (group) => group.massKg,
            align: 'right',
          },
          {
            key: 'share',
            head: t('receipts.share'),
            cell: (group) => formatShare(group.massKg / massKg, locale),
            align: 'right',
          },
        ]}
        totals={{
          use: t('common.total'),
          count: formatCount(
            total(({ buildingCount }) => buildingCount),
            locale,
          ),
          area: formatCount(
            total(({ floorAreaM2 }) => floorAreaM2),
            locale,
          ),
          mass: formatMassFigure(massKg, locale, unit),
        }}
        onSaveCsv={() =>
          downloadText(
            `run-${run.number}-receipt-groups.csv`,
            csvText([
              ['use', 'structure', 'period', 'buildings', 'floor_area_m2', 'mass_kg'],
              ...groups.map((group) => [
                group.use,
                group.structure,
                group.period,
                group.buildingCount,
                group.floorAreaM2,
                group.massKg,
              ]),
            ]),
            'text/csv',
          )
        }
      />
      <AppText soft>{t('receipts.chooseGroup')}</AppText>
    </Panel>
  )
}
