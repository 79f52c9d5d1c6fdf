import { Barlow_400Regular } from '@expo-google-fonts/barlow/400Regular'
import { Barlow_500Medium } from '@expo-google-fonts/barlow/500Medium'
import { Barlow_600SemiBold } from '@expo-google-fonts/barlow/600SemiBold'
import { Barlow_700Bold } from '@expo-google-fonts/barlow/700Bold'
import { useFonts } from 'expo-font'

/**
 * Loads the four weights of Barlow that the app ships.
 *
 * @returns whether drawing may begin: the fonts are there, or they failed and the system's sans serif stands in
 */
export function useAppFonts(): boolean {
  const [loaded, error] = useFonts({ Barlow_400Regular, Barlow_500Medium, Barlow_600SemiBold, Barlow_700Bold })
  return loaded || error !== null
}
