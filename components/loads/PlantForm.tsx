import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { NumberField } from '@/components/ui/NumberField'
import { Panel } from '@/components/ui/Panel'
import { SPACE } from '@/components/ui/theme/tokens'
import { formatDecimal } from '@/shared/format'
import { yardPlan, type YardPlan } from '@/shared/schemas/yardPlan'

interface PlantFormProps {
  readonly plan: YardPlan
  readonly isCounting: boolean
  readonly onKeep: (plan: YardPlan) => void
}

const { containerM3: containerRule, payloadT: payloadRule, capacityTPerYear: capacityRule } = yardPlan.shape

/** What my vehicles carry and my plant takes in; kept for the next visit, and the loads are counted anew with it. */
export function PlantForm({ plan, isCounting, onKeep }: PlantFormProps) {
  const { t, locale } = useMessages()
  const [containerM3, setContainer] = useState<number | null>(plan.containerM3)
  const [payloadT, setPayload] = useState<number | null>(plan.payloadT)
  const [capacityTPerYear, setCapacity] = useState<number | null>(plan.capacityTPerYear)
  const isContainerFine = containerRule.safeParse(containerM3).success
  const isPayloadFine = payloadRule.safeParse(payloadT).success
  const isCapacityFine = capacityRule.safeParse(capacityTPerYear).success
  return (
    <Panel title={t('loads.fleet')}>
      <AppText soft>{t('loads.fleetNote')}</AppText>
      <View style={styles.row}>
        <View style={styles.field}>
          <NumberField
            label={t('loads.container')}
            unit="m³"
            value={containerM3}
            onChange={setContainer}
            error={isContainerFine ? undefined : t('loads.containerFault')}
          />
        </View>
        <View style={styles.field}>
          <NumberField
            label={t('loads.payload')}
            unit="t"
            value={payloadT}
            onChange={setPayload}
            error={isPayloadFine ? undefined : t('loads.payloadFault')}
          />
        </View>
        <View style={styles.field}>
          <NumberField
            label={t('loads.capacity')}
            unit="t/a"
            grouping
            value={capacityTPerYear}
            onChange={setCapacity}
            error={isCapacityFine ? undefined : t('loads.capacityFault')}
          />
        </View>
        <Button
          kind="primary"
          label={t('loads.keepPlan')}
          busy={isCounting}
          disabled={!isContainerFine || !isPayloadFine || !isCapacityFine}
          onPress={() => {
            if (containerM3 !== null && payloadT !== null) onKeep({ ...plan, containerM3, payloadT, capacityTPerYear })
          }}
        />
      </View>
      <AppText soft>
        {t('loads.fleetNow', {
          container: `${formatDecimal(plan.containerM3, locale, 1)}\u00a0m³`,
          payload: `${formatDecimal(plan.payloadT, locale, 1)}\u00a0t`,
        })}
      </AppText>
    </Panel>
  )
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-end', gap: SPACE.medium },
  field: { flexGrow: 1, flexBasis: 140, maxWidth: 240 },
})
