import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { Choice } from '@/components/ui/Choice'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { FACTOR_PARTS, type FactorPart } from '@/shared/factorBook/factorColumns'
import type { FullEdition } from '@/shared/schemas/factorBook'
import { FactorRowDialog } from './FactorRowDialog'
import { IntensityTable } from './IntensityTable'
import { densityColumns, lifetimeColumns, suspicionColumns, wasteCodeColumns } from './partColumns'
import { PartTable } from './PartTable'
import { PlausibilityPanel } from './PlausibilityPanel'

/** The parts of an edition, one at a time; in a draft each row opens to be changed. */
export function EditionParts({ edition }: { readonly edition: FullEdition }) {
  const messages = useMessages()
  const { t } = messages
  const [part, setPart] = useState<FactorPart>('intensities')
  // a new row has no row yet
  const [open, setOpen] = useState<{ readonly rowId: string } | 'new' | null>(null)
  const { rows } = edition
  const isDraft = edition.state === 'draft'
  const onChange = isDraft ? setOpen : undefined
  const fileName = `factor-book-${edition.number}-${part}.csv`
  const title = t(`factorBook.${part}`)
  return (
    <>
      <Choice
        label={t('factorBook.part')}
        options={FACTOR_PARTS.map((value) => ({ value, label: t(`factorBook.${value}`) }))}
        value={part}
        onChange={setPart}
      />
      <AppText soft>{t('factorBook.fromMemoryNote')}</AppText>
      {part === 'densities' || part === 'wasteCodes' || part === 'suspicions' ? (
        <Notice tone="attention" whatHappened={t('factorBook.ownTablesNote')} />
      ) : null}
      {isDraft ? (
        <View style={styles.row}>
          <Button icon="plus" label={t('factorBook.addRow')} onPress={() => setOpen('new')} />
        </View>
      ) : null}
      {part === 'intensities' ? <PlausibilityPanel rows={rows.intensities} /> : null}
      {part === 'intensities' ? (
        <IntensityTable rows={rows.intensities} fileName={fileName} onChange={onChange} />
      ) : null}
      {part === 'lifetimes' ? (
        <PartTable
          title={title}
          rows={rows.lifetimes}
          columns={lifetimeColumns(messages)}
          fileName={fileName}
          onChange={onChange}
        />
      ) : null}
      {part === 'densities' ? (
        <PartTable
          title={title}
          rows={rows.densities}
          columns={densityColumns(messages)}
          fileName={fileName}
          onChange={onChange}
        />
      ) : null}
      {part === 'wasteCodes' ? (
        <PartTable
          title={title}
          rows={rows.wasteCodes}
          columns={wasteCodeColumns(messages)}
          fileName={fileName}
          onChange={onChange}
        />
      ) : null}
      {part === 'suspicions' ? (
        <PartTable
          title={title}
          note={t('factorBook.suspicionNote')}
          rows={rows.suspicions}
          columns={suspicionColumns(messages)}
          fileName={fileName}
          onChange={onChange}
        />
      ) : null}
      {open === null ? null : (
        <FactorRowDialog
          editionId={edition.editionId}
          part={part}
          {...(open === 'new' ? {} : { row: open })}
          onClose={() => setOpen(null)}
        />
      )}
    </>
  )
}

const styles = StyleSheet.create({ row: { flexDirection: 'row' } })
