import { DataTable } from '@/components/ui/DataTable'
import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import type { OutlineFault } from '@/shared/schemas/outline'

/** What is wrong in a file, feature by feature; the rest can be imported. */
export function ImportFaults({ faults }: { readonly faults: readonly OutlineFault[] }) {
  const { t } = useMessages()
  if (faults.length === 0) return <AppText soft>{t('rounds.noFaults')}</AppText>
  return (
    <DataTable
      label={t('rounds.faults')}
      showLabel
      pageSize={20}
      rows={faults.map((fault, index) => ({ ...fault, key: `${fault.index}-${fault.code}-${index}` }))}
      rowKey={(fault) => fault.key}
      columns={[
        { key: 'index', head: t('rounds.feature'), align: 'right', cell: (fault) => String(fault.index + 1) },
        { key: 'reference', head: t('rounds.ours.reference'), cell: (fault) => fault.reference ?? '–' },
        { key: 'fault', head: t('rounds.fault'), weight: 3, cell: (fault) => t(`rounds.faultCode.${fault.code}`) },
        {
          key: 'mended',
          head: t('rounds.outcome'),
          cell: (fault) => (fault.isMended ? t('rounds.mended') : t('rounds.leftOut')),
        },
      ]}
    />
  )
}
