import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { CheckBox } from '@/components/ui/CheckBox'
import { useMessages } from '@/components/ui/MessagesProvider'
import { NumberField } from '@/components/ui/NumberField'
import { Select } from '@/components/ui/Select'
import { TextField } from '@/components/ui/TextField'
import { SPACE } from '@/components/ui/theme/tokens'
import type { Round } from '@/shared/api/rounds'
import type { Edition } from '@/shared/schemas/factorBook'
import type { DraftFaults, RunDraft } from './runDraft'

interface NewRunFormProps {
  readonly draft: RunDraft
  readonly onChange: (draft: RunDraft) => void
  readonly rounds: readonly Round[]
  readonly editions: readonly Edition[]
  readonly faults: DraftFaults
}

/** Round, edition and scenario of a new run. */
export function NewRunForm({ draft, onChange, rounds, editions, faults }: NewRunFormProps) {
  const { t } = useMessages()
  const errorOf = (field: keyof RunDraft): string | undefined => {
    const key = faults[field]
    return key ? t(key) : undefined
  }
  return (
    <View style={styles.stack}>
      <AppText>{t('runs.newRunLead')}</AppText>
      <Select
        label={t('runs.round')}
        options={rounds.map(({ roundId, name, districtName }) => ({
          value: roundId,
          label: `${name} · ${districtName}`,
        }))}
        value={draft.roundId}
        onChange={(roundId) => onChange({ ...draft, roundId })}
        error={errorOf('roundId')}
      />
      <Select
        label={t('runs.edition')}
        options={editions
          .filter(({ state }) => state === 'issued')
          .map(({ editionId, number, name }) => ({
            value: editionId,
            label: t('runs.editionOption', { number, name }),
          }))}
        value={draft.editionId}
        onChange={(editionId) => onChange({ ...draft, editionId })}
        error={errorOf('editionId')}
      />
      <TextField
        label={t('runs.scenarioName')}
        value={draft.name}
        onChange={(name) => onChange({ ...draft, name })}
        maxLength={120}
        error={errorOf('name')}
      />
      <NumberField
        label={t('runs.horizon')}
        value={draft.horizonYears}
        onChange={(horizonYears) => onChange({ ...draft, horizonYears })}
        whole
        error={errorOf('horizonYears')}
      />
      <NumberField
        label={t('runs.seed')}
        hint={t('runs.seedHint')}
        value={draft.seed}
        onChange={(seed) => onChange({ ...draft, seed })}
        whole
        error={errorOf('seed')}
      />
      <CheckBox
        label={t('runs.hazard')}
        hint={t('runs.hazardHint')}
        checked={draft.appliesHazardMultipliers}
        onChange={(appliesHazardMultipliers) => onChange({ ...draft, appliesHazardMultipliers })}
      />
    </View>
  )
}

const styles = StyleSheet.create({ stack: { gap: SPACE.medium } })
