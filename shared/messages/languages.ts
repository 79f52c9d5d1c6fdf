import { createMessages } from './createMessages'
import { de } from './de'
import { en } from './en'
import type { Messages, MessageTree } from './messages.types'

/** Languages of the product, each with its own name for itself; another needs a catalogue and a line here. */
export const LANGUAGES = {
  en: { ownName: 'English', locale: 'en-GB', catalogue: en },
  de: { ownName: 'Deutsch', locale: 'de-DE', catalogue: de },
} as const satisfies Record<string, { ownName: string; locale: string; catalogue: MessageTree }>

export type Language = keyof typeof LANGUAGES

/** Whether the product speaks this language. */
export function isLanguage(word: unknown): word is Language {
  return typeof word === 'string' && word in LANGUAGES
}

/**
 * The language of a list of wishes that the product speaks; English when it speaks none.
 *
 * @param wishes BCP 47 tags, best first, as a browser gives them
 * @example
 * firstSpoken(['gsw-CH', 'de-CH', 'en']) // => 'de'
 * firstSpoken(['fr']) // => 'en'
 */
export function firstSpoken(wishes: readonly string[]): Language {
  return wishes.map((wish) => wish.toLowerCase().split('-')[0]).find(isLanguage) ?? 'en'
}

/** The texts of a language, with the dates and numbers of its locale. */
export function messagesIn(language: Language): Messages {
  const { locale, catalogue } = LANGUAGES[language]
  return createMessages(locale, catalogue)
}
