import type { GestureResponderEvent } from 'react-native'

/**
 * Keeps a press on a link inside the app, so that the router follows it and not the browser.
 *
 * @returns whether the router is to follow; false for a press with a modifier key, which opens a tab or a window
 */
export function keepInApp(event: GestureResponderEvent): boolean {
  const native: unknown = event.nativeEvent
  const isModified =
    typeof native === 'object' &&
    native !== null &&
    ['metaKey', 'ctrlKey', 'shiftKey'].some((key) => Reflect.get(native, key) === true)
  if (!isModified) event.preventDefault()
  return !isModified
}
