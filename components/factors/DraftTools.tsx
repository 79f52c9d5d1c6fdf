import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { SPACE } from '@/components/ui/theme/tokens'
import type { FullEdition } from '@/shared/schemas/factorBook'
import { DiscardDialog } from './DiscardDialog'
import { IssueDialog } from './IssueDialog'

/** What is done with a draft as a whole: issue it, or delete it. */
export function DraftTools({ edition }: { readonly edition: FullEdition }) {
  const { t } = useMessages()
  const [open, setOpen] = useState<'issue' | 'discard' | null>(null)
  return (
    <Panel tone="attention" title={t('factorBook.draft')}>
      <AppText>{t('factorBook.draftLead')}</AppText>
      <View style={styles.row}>
        <Button kind="primary" label={t('factorBook.issue')} onPress={() => setOpen('issue')} />
        <Button kind="danger" label={t('factorBook.discard')} onPress={() => setOpen('discard')} />
      </View>
      {open === 'issue' ? <IssueDialog edition={edition} onClose={() => setOpen(null)} /> : null}
      {open === 'discard' ? <DiscardDialog edition={edition} onClose={() => setOpen(null)} /> : null}
    </Panel>
  )
}

const styles = StyleSheet.create({ row: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.small } })
