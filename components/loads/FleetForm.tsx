import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { NumberField } from '@/components/ui/NumberField'
import { Panel } from '@/components/ui/Panel'
import { SPACE } from '@/components/ui/theme/tokens'
import { fleet as fleetSchema } from '@/shared/api/publications'
import { formatDecimal } from '@/shared/format'
import type { Fleet } from './loadQueries'

interface FleetFormProps {
  readonly fleet: Fleet
  readonly isCounting: boolean
  readonly onApply: (fleet: Fleet) => void
}

/** What my vehicles carry; the loads are counted anew with it. */
export function FleetForm({ fleet, isCounting, onApply }: FleetFormProps) {
  const { t, locale } = useMessages()
  const [containerM3, setContainer] = useState<number | null>(fleet.containerM3)
  const [payloadT, setPayload] = useState<number | null>(fleet.payloadT)
  const isContainerFine = containerM3 !== null && fleetSchema.shape.containerM3.safeParse(containerM3).success
  const isPayloadFine = payloadT !== null && fleetSchema.shape.payloadT.safeParse(payloadT).success
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
        <Button
          kind="primary"
          label={t('loads.apply')}
          busy={isCounting}
          disabled={!isContainerFine || !isPayloadFine}
          onPress={() => {
            if (containerM3 !== null && payloadT !== null) onApply({ containerM3, payloadT })
          }}
        />
      </View>
      <AppText soft>
        {t('loads.fleetNow', {
          container: `${formatDecimal(fleet.containerM3, locale, 1)}\u00a0m³`,
          payload: `${formatDecimal(fleet.payloadT, locale, 1)}\u00a0t`,
        })}
      </AppText>
    </Panel>
  )
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-end', gap: SPACE.medium },
  field: { flexGrow: 1, flexBasis: 140, maxWidth: 240 },
})
