import { Platform } from 'react-native'

/**
 * Props that only the web build of React Native takes (`href`, `dataSet`, `aria-current` …) and its types do not name.
 *
 * @returns the props on the web, none elsewhere
 */
export function webOnly(props: Readonly<Record<string, unknown>>): object {
  return Platform.OS === 'web' ? props : {}
}
