import { createContext, useContext, useEffect, useMemo, useState, type ReactNode } from 'react'
import { firstSpoken, isLanguage, messagesIn, type Language } from '@/shared/messages/languages'
import { MessagesProvider } from './MessagesProvider'
import { deviceStorage, type ChoiceStorage } from './theme/deviceStorage'
import { setDocumentLanguage } from './web/setDocumentLanguage'

/** The language in force, and how to choose another. */
export interface LanguageChoice {
  readonly language: Language
  readonly setLanguage: (language: Language) => void
}

const STORAGE_KEY = 'tallystone.language'
const LanguageContext = createContext<LanguageChoice>({ language: 'en', setLanguage: () => {} })

interface LanguageProviderProps {
  readonly children: ReactNode
  /** Where the choice is kept; this device's own storage when left out. */
  readonly storage?: ChoiceStorage
  /** What the device asks for, best first; the browser's list when left out. */
  readonly wishes?: readonly string[]
}

/** Gives every component below it the texts of the chosen language, at first those the device asks for. */
export function LanguageProvider({ children, storage, wishes }: LanguageProviderProps) {
  const [kept] = useState(() => storage ?? deviceStorage())
  const [language, setLanguage] = useState<Language>(() => {
    const chosen = kept.getItem(STORAGE_KEY)
    return isLanguage(chosen) ? chosen : firstSpoken(wishes ?? globalThis.navigator?.languages ?? [])
  })
  useEffect(() => setDocumentLanguage(language), [language])
  const messages = useMemo(() => messagesIn(language), [language])
  const choice = useMemo(
    (): LanguageChoice => ({
      language,
      setLanguage(next) {
        kept.setItem(STORAGE_KEY, next)
        setLanguage(next)
      },
    }),
    [language, kept],
  )
  return (
    <LanguageContext value={choice}>
      <MessagesProvider messages={messages}>{children}</MessagesProvider>
    </LanguageContext>
  )
}

/** What the person chose, for the screen where it is chosen. */
export function useLanguageChoice(): LanguageChoice {
  return useContext(LanguageContext)
}
