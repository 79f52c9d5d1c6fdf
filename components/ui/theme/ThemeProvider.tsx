import { createContext, useContext, useEffect, useMemo, useState, type ReactNode } from 'react'
import { useColorScheme } from 'react-native'
import { applyThemeToDocument } from '@/components/ui/web/applyThemeToDocument'
import { usePrinting } from '@/components/ui/web/usePrinting'
import { deviceStorage, type ChoiceStorage } from './deviceStorage'
import { THEMES, type Theme, type ThemeName } from './tokens'

/** Which look a person chose: the device's own, or one of the two. */
export type Look = 'system' | 'limewash' | 'night'

/** What a person chose, and how to choose anew. */
export interface ThemeChoice {
  readonly look: Look
  readonly isBrightSun: boolean
  readonly setLook: (look: Look) => void
  readonly setBrightSun: (isBrightSun: boolean) => void
}

interface Choice {
  readonly look: Look
  readonly isBrightSun: boolean
}

const STORAGE_KEY = 'tallystone.look'
const FIRST_CHOICE: Choice = { look: 'system', isBrightSun: false }

const ThemeContext = createContext<Theme>(THEMES.limewash)
const ChoiceContext = createContext<ThemeChoice>({ ...FIRST_CHOICE, setLook: () => {}, setBrightSun: () => {} })

interface ThemeProviderProps {
  readonly children: ReactNode
  /** Where the choice is kept; this device's own storage when left out. */
  readonly storage?: ChoiceStorage
}

/**
 * Gives every component below it the theme that the person chose, and keeps the choice on the device. Paper is always
 * limewash.
 */
export function ThemeProvider({ children, storage }: ThemeProviderProps) {
  const [kept] = useState(() => storage ?? deviceStorage())
  const [choice, setChoice] = useState(() => readChoice(kept))
  const systemIsNight = useColorScheme() === 'dark'
  const isPrinting = usePrinting()
  const theme = isPrinting ? THEMES.limewash : THEMES[themeName(choice, systemIsNight)]

  useEffect(() => applyThemeToDocument(theme), [theme])

  const chosen = useMemo((): ThemeChoice => {
    const keep = (next: Choice): void => {
      kept.setItem(STORAGE_KEY, JSON.stringify(next))
      setChoice(next)
    }
    return {
      ...choice,
      setLook: (look) => keep({ ...choice, look }),
      setBrightSun: (isBrightSun) => keep({ ...choice, isBrightSun }),
    }
  }, [choice, kept])

  return (
    <ThemeContext value={theme}>
      <ChoiceContext value={chosen}>{children}</ChoiceContext>
    </ThemeContext>
  )
}

/** The theme in force; limewash outside a provider. */
export function useTheme(): Theme {
  return useContext(ThemeContext)
}

/** What the person chose, for the screen where it is chosen. */
export function useThemeChoice(): ThemeChoice {
  return useContext(ChoiceContext)
}

/**
 * Styles made from the theme, made once a theme.
 *
 * @param makeStyles a function at the foot of the component's file, never one made while drawing
 */
export function useStyles<Styles>(makeStyles: (theme: Theme) => Styles): Styles {
  const theme = useTheme()
  return useMemo(() => makeStyles(theme), [makeStyles, theme])
}

function themeName({ look, isBrightSun }: Choice, systemIsNight: boolean): ThemeName {
  const isNight = look === 'night' || (look === 'system' && systemIsNight)
  if (isNight) return isBrightSun ? 'night-sun' : 'night'
  return isBrightSun ? 'limewash-sun' : 'limewash'
}

function readChoice(storage: ChoiceStorage): Choice {
  try {
    const read: unknown = JSON.parse(storage.getItem(STORAGE_KEY) ?? 'null')
    if (typeof read !== 'object' || read === null) return FIRST_CHOICE
    const look = 'look' in read ? read.look : undefined
    const isBrightSun = 'isBrightSun' in read && read.isBrightSun === true
    return { look: look === 'limewash' || look === 'night' ? look : 'system', isBrightSun }
  } catch {
    return FIRST_CHOICE
  }
}
