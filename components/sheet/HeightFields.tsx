import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { NumberField } from '@/components/ui/NumberField'
import { Select } from '@/components/ui/Select'
import { SPACE } from '@/components/ui/theme/tokens'
import { BRICK_COURSINGS, type BrickCoursing } from '@/shared/compute/area/brickCoursings'
import { storeyHeightFromCourses } from '@/shared/compute/area/storeyHeightFromCourses'
import { storeysFromHeight } from '@/shared/compute/area/storeysFromHeight'
import { formatDecimal } from '@/shared/format'
import type { SheetAnswers } from '@/shared/schemas/sheet'
import type { SectionProps } from './form.types'
import { GroupKnownBy } from './GroupKnownBy'

const HEIGHTS = ['eavesM', 'ridgeM', 'storeyHeightM'] as const
const COURSING_NAMES = Object.keys(BRICK_COURSINGS) as BrickCoursing[]

/** Eaves, ridge and storey height; storeys that follow from them; and a count of brick courses for who has no tape. */
export function HeightFields({ answers, faults, answer }: SectionProps) {
  const { t, locale } = useMessages()
  const { heights, storeys } = answers
  const empty = { eavesM: null, ridgeM: null, storeyHeightM: null }
  const set = (part: Partial<NonNullable<SheetAnswers['heights']>>) =>
    answer('heights', { knownBy: 'guessed', ...empty, ...heights, ...part })
  const guess = guessStoreys(heights)
  return (
    <>
      <View style={styles.row}>
        {HEIGHTS.map((name) => (
          <View key={name} style={styles.third}>
            <NumberField
              label={t(`sheet.heights.${name}`)}
              unit="m"
              value={heights?.[name] ?? null}
              error={faults.heights}
              onChange={(value) => set({ [name]: value })}
            />
          </View>
        ))}
      </View>
      <GroupKnownBy
        of={t('sheet.group.heights')}
        answer={heights}
        isKnown={HEIGHTS.some((name) => heights?.[name])}
        onChange={(next) => answer('heights', next)}
      />
      {guess !== null && guess !== storeys?.aboveGround ? (
        <Button
          kind="secondary"
          label={t('sheet.heights.takeStoreys', { count: guess })}
          onPress={() => answer('storeys', { aboveGround: guess, knownBy: 'guessed' })}
        />
      ) : null}
      <CourseCount
        onHeight={(storeyHeightM) => set({ storeyHeightM, knownBy: 'seen' })}
        written={(heightM) => formatDecimal(heightM, locale, 2)}
      />
    </>
  )
}

function guessStoreys(heights: SheetAnswers['heights']): number | null {
  const { eavesM = null, storeyHeightM = null } = heights ?? {}
  if (!eavesM || !storeyHeightM || storeyHeightM < 1 || eavesM < 1) return null
  return storeysFromHeight(eavesM, storeyHeightM).storeys
}

interface CourseCountProps {
  readonly onHeight: (storeyHeightM: number) => void
  readonly written: (heightM: number) => string
}

/** Courses from one sill to the sill above, times the height of a course. */
function CourseCount({ onHeight, written }: CourseCountProps) {
  const { t } = useMessages()
  const [courses, setCourses] = useState<number | null>(null)
  const [coursing, setCoursing] = useState<BrickCoursing>('metric-75')
  const [courseMm, setCourseMm] = useState<number | null>(BRICK_COURSINGS['metric-75'].courseMm)
  const heightM = courses && courses > 0 && courseMm && courseMm > 0 ? storeyHeightFromCourses(courses, courseMm) : null
  const isPlausible = heightM !== null && heightM >= 1.8 && heightM <= 12
  return (
    <View style={styles.stack}>
      <AppText soft>{t('sheet.courses.how')}</AppText>
      <Select
        label={t('sheet.courses.brick')}
        value={coursing}
        onChange={(next) => {
          setCoursing(next)
          setCourseMm(BRICK_COURSINGS[next].courseMm)
        }}
        options={COURSING_NAMES.map((value) => ({ value, label: t(`sheet.courses.bricks.${value}`) }))}
      />
      <View style={styles.row}>
        <View style={styles.third}>
          <NumberField label={t('sheet.courses.count')} whole value={courses} onChange={setCourses} />
        </View>
        <View style={styles.third}>
          <NumberField label={t('sheet.courses.height')} unit="mm" value={courseMm} onChange={setCourseMm} />
        </View>
      </View>
      {heightM === null ? null : isPlausible ? (
        <Button
          kind="secondary"
          label={t('sheet.courses.take', { height: written(heightM) })}
          onPress={() => onHeight(Math.round(heightM * 100) / 100)}
        />
      ) : (
        <AppText tone="attention">{t('sheet.courses.notPlausible', { height: written(heightM) })}</AppText>
      )}
    </View>
  )
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.small },
  third: { flexGrow: 1, flexBasis: 100, minWidth: 0 },
  stack: { gap: SPACE.small },
})
