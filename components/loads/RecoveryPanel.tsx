import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { NumberField } from '@/components/ui/NumberField'
import { Panel } from '@/components/ui/Panel'
import { SPACE } from '@/components/ui/theme/tokens'
import { formatMass, formatShare } from '@/shared/format'
import type { YardPlan } from '@/shared/schemas/yardPlan'
import type { CodeTotal } from './codeTotals'
import { recoveryOf, recoveryRows } from './recoveryRows'

interface RecoveryPanelProps {
  readonly totals: readonly CodeTotal[]
  readonly plan: YardPlan
  readonly isKeeping: boolean
  readonly onKeep: (plan: YardPlan) => void
}

const PERCENT = 100

/** What my yard recovers of each code, and how that stands against the target of the directive. */
export function RecoveryPanel({ totals, plan, isKeeping, onKeep }: RecoveryPanelProps) {
  const { t, locale } = useMessages()
  const [shares, setShares] = useState<Readonly<Record<string, number | null>>>(plan.recoveryShares)
  const said = Object.fromEntries(
    Object.entries(shares).filter((entry): entry is [string, number] => entry[1] !== null),
  )
  const isFine = Object.values(said).every((share) => share >= 0 && share <= 1)
  const rows = recoveryRows(totals, isFine ? said : plan.recoveryShares)
  const reached = recoveryOf(rows)
  return (
    <Panel title={t('loads.recovery')}>
      <AppText soft>{t('loads.recoveryNote')}</AppText>
      {reached ? (
        <Notice
          tone={reached.meetsTarget ? 'good' : 'attention'}
          whatHappened={t(reached.meetsTarget ? 'loads.recoveryMet' : 'loads.recoveryMissed', {
            share: formatShare(reached.share, locale),
            mass: formatMass(reached.countedKg, locale),
          })}
        />
      ) : null}
      <View style={styles.fields}>
        {rows.map(({ code, text, massKg, counts, recoveredKg }) => {
          const share = shares[code] ?? null
          const isShare = share === null || (share >= 0 && share <= 1)
          return (
            <View key={code} style={styles.field}>
              <NumberField
                label={`${code} ${text}`}
                unit="%"
                value={share === null ? null : share * PERCENT}
                onChange={(percent) => setShares({ ...shares, [code]: percent === null ? null : percent / PERCENT })}
                hint={t(counts ? 'loads.recoveryOf' : 'loads.recoveryHazardous', {
                  recovered: formatMass(recoveredKg, locale),
                  mass: formatMass(massKg, locale),
                })}
                error={isShare ? undefined : t('loads.recoveryFault')}
              />
            </View>
          )
        })}
      </View>
      <View style={styles.act}>
        <Button
          label={t('loads.keepRecovery')}
          busy={isKeeping}
          disabled={!isFine}
          onPress={() => onKeep({ ...plan, recoveryShares: said })}
        />
      </View>
    </Panel>
  )
}

const styles = StyleSheet.create({
  fields: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.medium },
  field: { flexGrow: 1, flexBasis: 260, maxWidth: 420 },
  act: { flexDirection: 'row' },
})
