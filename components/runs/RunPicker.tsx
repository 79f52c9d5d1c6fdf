import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Select } from '@/components/ui/Select'
import { SPACE } from '@/components/ui/theme/tokens'
import type { RunSummary } from '@/shared/schemas/run'
import { NewRunDialog } from './NewRunDialog'

interface RunPickerProps {
  readonly finished: readonly RunSummary[]
  readonly run: RunSummary | null
  readonly onChoose: (runId: string) => void
}

/** Which run is shown, and the way to a new one. */
export function RunPicker({ finished, run, onChoose }: RunPickerProps) {
  const { t } = useMessages()
  return (
    <View style={styles.row}>
      {finished.length > 0 ? (
        <View style={styles.select}>
          <Select
            label={t('runs.run')}
            options={finished.map(({ runId, number, roundName, scenario }) => ({
              value: runId,
              label: t('runs.option', { number, round: roundName, scenario: scenario.name }),
            }))}
            value={run?.runId ?? null}
            onChange={onChoose}
          />
        </View>
      ) : null}
      <NewRunButton onDone={onChoose} />
    </View>
  )
}

/** Opens the dialog that computes a new run. */
export function NewRunButton({ onDone }: { readonly onDone: (runId: string) => void }) {
  const { t } = useMessages()
  const [isOpen, setIsOpen] = useState(false)
  return (
    <>
      <Button kind="secondary" label={t('runs.newRun')} onPress={() => setIsOpen(true)} />
      {isOpen ? <NewRunDialog onClose={() => setIsOpen(false)} onDone={onDone} /> : null}
    </>
  )
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-end', gap: SPACE.medium },
  select: { flexGrow: 1, flexBasis: 260, maxWidth: 560 },
})
