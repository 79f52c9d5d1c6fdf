import { useState, type ReactNode } from 'react'
import { StyleSheet, View } from 'react-native'
import { Button } from '@/components/ui/Button'
import { SPACE } from '@/components/ui/theme/tokens'

interface FurtherProps {
  readonly label: string
  /** Open from the start where something is answered in it, or is wrong. */
  readonly isOpenAtFirst: boolean
  readonly children: ReactNode
}

/** What an ordinary house does not need, behind one button. */
export function Further({ label, isOpenAtFirst, children }: FurtherProps) {
  const [isOpen, setIsOpen] = useState(isOpenAtFirst)
  return (
    <View style={styles.stack}>
      <Button
        kind="quiet"
        icon={isOpen ? 'up' : 'down'}
        label={label}
        expanded={isOpen}
        onPress={() => setIsOpen(!isOpen)}
      />
      {isOpen ? children : null}
    </View>
  )
}

const styles = StyleSheet.create({ stack: { gap: SPACE.medium } })
