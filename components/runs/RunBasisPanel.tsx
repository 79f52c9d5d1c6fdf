import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Panel } from '@/components/ui/Panel'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { SPACE } from '@/components/ui/theme/tokens'
import type { RunResult, RunSummary } from '@/shared/schemas/run'
import { basisLines, rateText } from './basisLines'

interface RunBasisPanelProps {
  readonly run: RunSummary
  readonly result: RunResult
}

/** What the figures of a run rest on; it stands beside them wherever they are shown. */
export function RunBasisPanel({ run, result }: RunBasisPanelProps) {
  const messages = useMessages()
  const { t, locale } = messages
  const { colours } = useTheme()
  const { impliedRateWarning, impliedDemolitionRatePerYear } = result.basis
  return (
    <Panel title={t('runs.basis')} tone="attention">
      {impliedRateWarning === null ? null : (
        <Notice
          tone="attention"
          whatHappened={t(impliedRateWarning === 'below-band' ? 'runs.rateBelow' : 'runs.rateAbove', {
            rate: rateText(impliedDemolitionRatePerYear, locale),
          })}
        />
      )}
      <AppText weight="semibold">{t('runs.expectation')}</AppText>
      <View role="list" aria-label={t('runs.basis')}>
        {basisLines(run, result, messages).map(({ key, label, value }) => (
          <View key={key} role="listitem" style={[styles.line, { borderColor: colours.hairline }]}>
            <AppText kind="label">{label}</AppText>
            <AppText kind="number">{value}</AppText>
          </View>
        ))}
      </View>
    </Panel>
  )
}

const styles = StyleSheet.create({
  line: { borderTopWidth: 1, paddingVertical: SPACE.small, gap: SPACE.hair },
})
