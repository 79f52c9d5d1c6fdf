import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { CheckBox } from '@/components/ui/CheckBox'
import { Choice } from '@/components/ui/Choice'
import { useMessages } from '@/components/ui/MessagesProvider'
import { NumberField } from '@/components/ui/NumberField'
import { Panel } from '@/components/ui/Panel'
import { SPACE } from '@/components/ui/theme/tokens'
import { deriveSheet } from '@/shared/schemas/deriveSheet'
import { STOREYS_IF_UNKNOWN } from '@/shared/schemas/sheetFloorArea'
import { formatArea, formatDecimal, formatShare } from '@/shared/format'
import type { KnownBy } from '@/shared/schemas/sheet'
import type { SectionProps } from './form.types'
import { Further } from './Further'
import { GroupKnownBy } from './GroupKnownBy'
import { HeightFields } from './HeightFields'
import { UnconfirmedNote } from './UnconfirmedNote'
import { usableAnswers } from './usableAnswers'

const GROUPS = ['storeys', 'footprint', 'attic', 'basement'] as const
const SHARES = { none: 0, half: 0.5, whole: 1, unknown: null } as const
type ShareName = keyof typeof SHARES
const SHARE_NAMES = ['none', 'half', 'whole', 'unknown'] as const

/** Storeys, footprint, attic and basement, and the gross floor area that follows. */
export function BigSection(props: SectionProps) {
  const { answers, faults, answer } = props
  const { t, locale } = useMessages()
  const { storeys, footprint } = answers
  const done = GROUPS.filter((group) => answers[group] !== undefined).length
  return (
    <Panel title={t('sheet.sections.big')} note={t('sheet.answered', { done, total: GROUPS.length })}>
      <NumberField
        label={t('sheet.storeys')}
        hint={t('sheet.storeysHint')}
        value={storeys?.aboveGround ?? null}
        error={faults.storeys}
        onChange={(aboveGround) =>
          answer(
            'storeys',
            aboveGround === null ? { aboveGround } : { aboveGround, knownBy: typedBy(storeys?.knownBy) },
          )
        }
        aside={
          <GroupKnownBy
            of={t('sheet.storeys')}
            answer={storeys}
            isKnown={storeys?.aboveGround !== null}
            onChange={(next) => answer('storeys', next)}
          />
        }
      />
      <UnconfirmedNote {...props} group="storeys" />
      <CheckBox
        label={t('sheet.storeysUnknown')}
        checked={storeys?.aboveGround === null}
        onChange={(isUnknown) =>
          answer('storeys', {
            aboveGround: isUnknown ? null : 1,
            ...(isUnknown ? {} : { knownBy: 'guessed' as const }),
          })
        }
      />
      <NumberField
        label={t('sheet.footprint')}
        hint={t('sheet.footprintHint')}
        unit="m²"
        value={footprint ? Math.round(footprint.footprintM2 * 10) / 10 : null}
        error={faults.footprint}
        onChange={(footprintM2) =>
          footprintM2 ? answer('footprint', { footprintM2, knownBy: 'measured' }) : undefined
        }
        aside={
          <GroupKnownBy
            of={t('sheet.footprint')}
            answer={footprint}
            isKnown
            onChange={(next) => answer('footprint', next)}
          />
        }
      />
      <UnconfirmedNote {...props} group="footprint" />
      {(['attic', 'basement'] as const).map((group) => (
        <View key={group} style={styles.stack}>
          <Choice<ShareName>
            label={t(`sheet.${group}`)}
            value={shareName(answers[group])}
            error={faults[group]}
            onChange={(name) =>
              answer(group, { floorShare: SHARES[name], ...(name === 'unknown' ? {} : { knownBy: 'seen' as const }) })
            }
            options={SHARE_NAMES.map((name) => ({ value: name, label: t(`sheet.share.${name}`) }))}
            aside={
              <GroupKnownBy
                of={t(`sheet.${group}`)}
                answer={answers[group]}
                isKnown={answers[group]?.floorShare !== null}
                onChange={(next) => answer(group, next)}
              />
            }
          />
          <UnconfirmedNote {...props} group={group} />
        </View>
      ))}
      <Further label={t('sheet.heights.title')} isOpenAtFirst={answers.heights !== undefined}>
        <HeightFields {...props} />
      </Further>
      <FloorArea {...props} locale={locale} />
    </Panel>
  )
}

/** Who types another figure than the register's has looked. */
function typedBy(before: KnownBy | undefined): KnownBy {
  return before === undefined || before === 'register' ? 'seen' : before
}

function shareName(value: SectionProps['answers']['attic']): ShareName | null {
  if (!value) return null
  if (value.floorShare === null) return 'unknown'
  if (value.floorShare === 0) return 'none'
  return value.floorShare <= 0.75 ? 'half' : 'whole'
}

function FloorArea({ answers, locale }: SectionProps & { readonly locale: string }) {
  const { t } = useMessages()
  const { grossFloorAreaM2, floorAreaCv, footprintM2 } = deriveSheet(usableAnswers(answers))
  const partCount = answers.parts?.parts.length ?? 0
  if (grossFloorAreaM2 === null || footprintM2 === null) return <AppText soft>{t('sheet.floorAreaMissing')}</AppText>
  const storeys = answers.storeys?.aboveGround ?? null
  const words = t(storeys === null ? 'sheet.floorAreaAssumed' : 'sheet.floorAreaWords', {
    footprint: formatArea(footprintM2, locale),
    storeys: formatDecimal(storeys ?? STOREYS_IF_UNKNOWN, locale, Number.isInteger(storeys ?? 1) ? 0 : 1),
  })
  return (
    <View style={styles.row}>
      <View style={styles.words}>
        <AppText weight="semibold">{t('sheet.floorArea')}</AppText>
        <AppText soft>{partCount > 0 ? t('sheet.floorAreaParts', { count: partCount }) : words}</AppText>
      </View>
      <View>
        <AppText kind="lead" weight="bold" align="right">
          {formatArea(grossFloorAreaM2, locale)}
        </AppText>
        <AppText soft align="right">
          {t('sheet.floorAreaError', { share: formatShare(1.28 * (floorAreaCv ?? 0), locale) })}
        </AppText>
      </View>
    </View>
  )
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', gap: SPACE.medium, paddingTop: SPACE.small },
  words: { flex: 1 },
  stack: { gap: SPACE.small },
})
