import { Platform } from 'react-native'

export type Weight = 'regular' | 'medium' | 'semibold' | 'bold'

const FAMILIES: Readonly<Record<Weight, string>> = {
  regular: 'Barlow_400Regular',
  medium: 'Barlow_500Medium',
  semibold: 'Barlow_600SemiBold',
  bold: 'Barlow_700Bold',
}

/**
 * Font family of a weight of Barlow. Each weight is a family of its own, so `fontWeight` is never set with it. On the
 * web the system's sans serif stands in until the font is there.
 */
export function fontFamily(weight: Weight): string {
  return Platform.OS === 'web' ? `${FAMILIES[weight]}, system-ui, sans-serif` : FAMILIES[weight]
}
