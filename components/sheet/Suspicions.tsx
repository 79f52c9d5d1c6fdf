import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { CheckBox } from '@/components/ui/CheckBox'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { SPACE } from '@/components/ui/theme/tokens'
import { COMPONENTS } from '@/shared/compute/factors/vocabulary'
import type { SectionProps } from './form.types'
import { Further } from './Further'
import { suspectedElements, type SuspectedElement } from './suspectedElements'

/** What to suspect at this age, by element, with the caution beside it. */
export function Suspicions(props: SectionProps) {
  const { answers } = props
  const { t } = useMessages()
  const elements = suspectedElements(answers)
  if (elements.length === 0) return <AppText soft>{t('sheet.suspicionsNone')}</AppText>
  const likely = elements.filter(({ isOfItsTime }) => isOfItsTime)
  const further = elements.filter(({ isOfItsTime }) => !isOfItsTime)
  const isAgeKnown = likely.length > 0 || (answers.constructionYear?.kind ?? 'unknown') !== 'unknown'
  const seen = answers.suspicions?.seen ?? []
  return (
    <>
      <Notice
        tone="attention"
        whatHappened={t(isAgeKnown ? 'sheet.suspicions' : 'sheet.suspicionsAgeUnknown')}
        whatIsSafe={t('cautions.suspicion')}
        whatToDo={t('cautions.doNotTouch')}
      />
      <AppText soft>{t('cautions.stayOutside')}</AppText>
      <ByElement {...props} elements={likely} />
      {further.length > 0 ? (
        <Further
          label={t(isAgeKnown ? 'sheet.suspicionsLater' : 'sheet.suspicionsAny', { count: further.length })}
          isOpenAtFirst={further.some(({ key }) => seen.includes(key))}
        >
          <ByElement {...props} elements={further} />
        </Further>
      ) : null}
    </>
  )
}

function ByElement({ answers, answer, elements }: SectionProps & { readonly elements: readonly SuspectedElement[] }) {
  const { t } = useMessages()
  const seen = answers.suspicions?.seen ?? []
  return COMPONENTS.map((component) => {
    const here = elements.filter((one) => one.component === component)
    if (here.length === 0) return null
    return (
      <View key={component} style={styles.group}>
        <AppText weight="semibold">{t(`vocabulary.component.${component}`)}</AppText>
        {here.map(({ key }) => (
          <CheckBox
            key={key}
            label={t('sheet.suspicionSeen', { element: key })}
            checked={seen.includes(key)}
            onChange={(isSeen) =>
              answer('suspicions', { seen: isSeen ? [...seen, key] : seen.filter((one) => one !== key) })
            }
          />
        ))}
      </View>
    )
  })
}

const styles = StyleSheet.create({ group: { gap: SPACE.tight } })
