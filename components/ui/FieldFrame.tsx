import type { ReactNode } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from './AppText'
import { Icon } from './Icon'
import { useTheme } from './theme/ThemeProvider'
import { SPACE } from './theme/tokens'

/** What every field has around it. */
export interface FieldProps {
  readonly label: string
  /** Quiet sentence under the field. */
  readonly hint?: string
  /** What is wrong with the answer, in words; takes the place of the hint. */
  readonly error?: string
  /** At the right of the label: how it is known, or a unit in words. */
  readonly aside?: ReactNode
  readonly disabled?: boolean
}

/** Ids of the parts of a field, for `aria-labelledby` and `aria-describedby`. */
export interface FieldIds {
  readonly label: string
  readonly note: string
}

/** Names of the parts made from the field's own id. */
export function fieldIds(id: string): FieldIds {
  return { label: `${id}-label`, note: `${id}-note` }
}

interface FieldFrameProps extends FieldProps {
  readonly ids: FieldIds
  readonly onPressLabel?: () => void
  readonly children: ReactNode
}

/** Label above, field, hint or error below. */
export function FieldFrame({ label, hint, error, aside, ids, onPressLabel, children }: FieldFrameProps) {
  const { colours } = useTheme()
  return (
    <View style={styles.frame}>
      <View style={styles.head}>
        <View style={styles.label}>
          <AppText id={ids.label} weight="medium" onPress={onPressLabel}>
            {label}
          </AppText>
        </View>
        {aside}
      </View>
      {children}
      {error ? (
        <View style={styles.error}>
          <Icon name="warning" size={18} colour={colours.error} />
          <View style={styles.label}>
            <AppText id={ids.note} tone="error" weight="medium">
              {error}
            </AppText>
          </View>
        </View>
      ) : hint ? (
        <AppText id={ids.note} soft>
          {hint}
        </AppText>
      ) : null}
    </View>
  )
}

const styles = StyleSheet.create({
  frame: { gap: SPACE.tight },
  head: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'center',
    justifyContent: 'space-between',
    columnGap: SPACE.small,
  },
  label: { flexShrink: 1 },
  error: { flexDirection: 'row', gap: SPACE.tight, alignItems: 'flex-start' },
})
