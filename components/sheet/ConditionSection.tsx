import { AppText } from '@/components/ui/AppText'
import { CheckBox } from '@/components/ui/CheckBox'
import { Choice } from '@/components/ui/Choice'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Panel } from '@/components/ui/Panel'
import { hazardSuspicions } from '@/shared/compute/waste/hazardSuspicions'
import { deriveSheet } from '@/shared/schemas/deriveSheet'
import { CONDITIONS, VACANCIES, type SheetAnswers } from '@/shared/schemas/sheet'
import type { SectionProps } from './form.types'

/** A first look at the state of the building, and what is to be suspected at its age. */
export function ConditionSection(props: SectionProps) {
  const { answers, answer } = props
  const { t } = useMessages()
  return (
    <Panel title={t('sheet.sections.condition')}>
      <Choice
        label={t('sheet.condition')}
        hint={t('cautions.condition')}
        value={answers.condition?.condition ?? null}
        onChange={(condition) =>
          answer('condition', { condition, ...(condition === 'unknown' ? {} : { knownBy: 'seen' as const }) })
        }
        options={CONDITIONS.map((value) => ({ value, label: t(`vocabulary.condition.${value}`) }))}
      />
      <Choice
        label={t('sheet.vacancy')}
        value={answers.vacancy?.vacancy ?? null}
        onChange={(vacancy) =>
          answer('vacancy', { vacancy, ...(vacancy === 'unknown' ? {} : { knownBy: 'seen' as const }) })
        }
        options={VACANCIES.map((value) => ({ value, label: t(`vocabulary.vacancy.${value}`) }))}
      />
      <CheckBox
        label={t('sheet.protected')}
        checked={answers.protection?.isProtected ?? false}
        onChange={(isProtected) => answer('protection', { isProtected, knownBy: 'told' })}
      />
      <Suspicions {...props} />
    </Panel>
  )
}

function Suspicions({ answers, answer }: SectionProps) {
  const { t } = useMessages()
  const elements = suspectedElements(answers)
  const seen = answers.suspicions?.seen ?? []
  if (elements.length === 0) return null
  return (
    <>
      <Notice
        tone="attention"
        whatHappened={t('sheet.suspicions')}
        whatIsSafe={t('cautions.suspicion')}
        whatToDo={t('cautions.doNotTouch')}
      />
      <AppText soft>{t('cautions.stayOutside')}</AppText>
      {elements.map((element) => (
        <CheckBox
          key={element}
          label={t('sheet.suspicionSeen', { element })}
          checked={seen.includes(element)}
          onChange={(isSeen) =>
            answer('suspicions', { seen: isSeen ? [...seen, element] : seen.filter((one) => one !== element) })
          }
        />
      ))}
    </>
  )
}

/** Only for years that are answered: at an age not known everything would be suspected. */
function suspectedElements(answers: SheetAnswers): readonly string[] {
  const { yearFrom, yearTo } = deriveSheet(answers)
  if (yearFrom === null || yearTo === null || yearFrom > yearTo || yearFrom < 1000) return []
  const found = hazardSuspicions({ construction: { fromYear: yearFrom, toYear: yearTo + 1 } })
  return found
    .filter(({ because }) => because === 'built-then')
    .map(({ row }) => `${row.substance}: ${row.element}`.slice(0, 120))
}
