import { useMutation, useQueryClient } from '@tanstack/react-query'
import { StyleSheet, View } from 'react-native'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { Choice } from '@/components/ui/Choice'
import { useMessages } from '@/components/ui/MessagesProvider'
import { NumberField } from '@/components/ui/NumberField'
import { Panel } from '@/components/ui/Panel'
import { Select } from '@/components/ui/Select'
import { SPACE } from '@/components/ui/theme/tokens'
import { chooseLookFigure, type NextLooksReply } from '@/shared/api/nextLook'
import { MATERIALS } from '@/shared/compute/factors/vocabulary'
import type { ChosenLookFigure } from '@/shared/schemas/nextLook'
import { useApi } from '@/sync/react/SessionProvider'
import { lookFigureText } from './lookFigureText'

interface FigureChoiceProps {
  readonly roundId: string
  readonly ranked: NextLooksReply
  readonly figure: ChosenLookFigure
  readonly onChange: (figure: ChosenLookFigure) => void
}

/** Years ahead that are offered first. */
const FIRST_SPAN_YEARS = 14

/** Which figure is to become surer, and whether the phones work for it too. */
export function FigureChoice({ roundId, ranked, figure, onChange }: FigureChoiceProps) {
  const { t } = useMessages()
  const { surveyYear, chosenFigure } = ranked
  const isAhead = figure.byYear !== null
  return (
    <Panel title={t('nextLook.figure')}>
      <View style={styles.row}>
        <Choice
          label={t('nextLook.figure')}
          options={[
            { value: 'stock', label: t('nextLook.kindStock') },
            { value: 'ahead', label: t('nextLook.kindAhead') },
          ]}
          value={isAhead ? 'ahead' : 'stock'}
          onChange={(kind) =>
            onChange({ ...figure, byYear: kind === 'stock' ? null : (figure.byYear ?? surveyYear + FIRST_SPAN_YEARS) })
          }
        />
        <View style={styles.field}>
          <Select
            label={t('nextLook.material')}
            options={[
              { value: 'all' as const, label: t('nextLook.allMaterials') },
              ...MATERIALS.map((value) => ({ value, label: t(`vocabulary.material.${value}`) })),
            ]}
            value={figure.material}
            onChange={(material) => onChange({ ...figure, material })}
          />
        </View>
        {isAhead ? (
          <View style={styles.field}>
            <NumberField
              whole
              label={t('nextLook.byYear')}
              hint={t('nextLook.yearHint', { from: String(surveyYear + 1) })}
              value={figure.byYear}
              onChange={(byYear) => {
                if (byYear !== null && byYear > surveyYear && byYear <= surveyYear + 200)
                  onChange({ ...figure, byYear })
              }}
            />
          </View>
        ) : null}
      </View>
      <TellPhones roundId={roundId} figure={figure} chosen={chosenFigure} />
    </Panel>
  )
}

interface TellPhonesProps {
  readonly roundId: string
  readonly figure: ChosenLookFigure
  readonly chosen: ChosenLookFigure
}

function TellPhones({ roundId, figure, chosen }: TellPhonesProps) {
  const { t } = useMessages()
  const api = useApi()
  const queries = useQueryClient()
  const tell = useMutation({
    mutationFn: () => api.call(chooseLookFigure, { params: { roundId }, body: figure }),
    onSuccess: () => queries.invalidateQueries({ queryKey: ['rounds', roundId, 'next-look'] }),
  })
  const isTold = figure.material === chosen.material && figure.byYear === chosen.byYear
  return (
    <>
      <AppText soft>{t('nextLook.told', { figure: lookFigureText(chosen, t) })}</AppText>
      {isTold ? null : (
        <View style={styles.action}>
          <Button label={t('nextLook.tellPhones')} busy={tell.isPending} onPress={() => tell.mutate()} />
        </View>
      )}
      {tell.error ? <ProblemNotice error={tell.error} onRetry={() => tell.mutate()} isSending /> : null}
    </>
  )
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.medium, alignItems: 'flex-start' },
  field: { flexGrow: 1, flexBasis: 160, maxWidth: 300 },
  action: { alignItems: 'flex-start' },
})
