import { createContext, useCallback, useContext, useEffect, useState, type ReactNode } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from './AppText'
import { IconButton } from './IconButton'
import { useMessages } from './MessagesProvider'
import { useTheme } from './theme/ThemeProvider'
import { HEAD_RULE, RADIUS, SPACE, toneColour, type Tone } from './theme/tokens'
import { webOnly } from './web/webOnly'

/** Long enough to read two lines twice. */
const SHOWN_MS = 7_000

interface ToastText {
  readonly message: string
  readonly tone: Tone
}

type ShowToast = (message: string, tone?: Tone) => void

const ToastContext = createContext<ShowToast>(() => {})

/** Shows short messages above the tab bar, one at a time, and reads them out. */
export function ToastProvider({ children }: { readonly children: ReactNode }) {
  const [shown, setShown] = useState<ToastText | null>(null)
  const { colours } = useTheme()
  const { t } = useMessages()
  const show = useCallback<ShowToast>((message, tone = 'good') => setShown({ message, tone }), [])

  useEffect(() => {
    if (!shown) return undefined
    const leaving = setTimeout(() => setShown(null), SHOWN_MS)
    return () => clearTimeout(leaving)
  }, [shown])

  return (
    <ToastContext value={show}>
      {children}
      <View
        role="status"
        aria-live="polite"
        {...webOnly({ 'aria-atomic': true, dataSet: { printHide: '' } })}
        style={styles.place}
      >
        {shown ? (
          <View
            style={[
              styles.toast,
              {
                backgroundColor: colours.panel,
                borderColor: colours.rule,
                borderTopColor: toneColour(shown.tone, colours),
              },
            ]}
          >
            <View style={styles.message}>
              <AppText weight="medium">{shown.message}</AppText>
            </View>
            <IconButton icon="close" label={t('common.close')} onPress={() => setShown(null)} />
          </View>
        ) : null}
      </View>
    </ToastContext>
  )
}

/** Says in passing that something is done: `showToast(t('bag.handedIn'))`. Faults belong in a `Notice`. */
export function useToast(): ShowToast {
  return useContext(ToastContext)
}

const styles = StyleSheet.create({
  place: {
    position: 'absolute',
    left: SPACE.medium,
    right: SPACE.medium,
    bottom: 88,
    alignItems: 'center',
    pointerEvents: 'box-none',
  },
  toast: {
    flexDirection: 'row',
    alignItems: 'center',
    maxWidth: 520,
    borderWidth: 1.5,
    borderTopWidth: HEAD_RULE,
    borderRadius: RADIUS,
    paddingLeft: SPACE.medium,
  },
  message: { flexShrink: 1, paddingVertical: SPACE.small },
})
