import { en } from './en'
import type { MessageKey, MessageParts, Messages, MessageTree } from './messages.types'

/**
 * The texts of one language, ready to be looked up.
 *
 * A text of the catalogue may hold `{name}` places and may come in plural forms (`one`, `other`, and what
 * `Intl.PluralRules` names for the language), chosen by the part `count`. A text that the catalogue lacks is taken
 * from English; a part that is not given stays visible as `{name}`.
 *
 * @param locale BCP 47 tag, such as `en` or `de-AT`
 * @param catalogue the texts, in the nesting of the English ones; may be incomplete
 * @returns the locale and `t`, which never throws: a wrong key shows itself
 * @example createMessages('en', en).t('common.sheets', { count: 6 }) // => '6 sheets'
 */
export function createMessages(locale: string, catalogue: MessageTree = en): Messages {
  const plurals = new Intl.PluralRules(locale)
  const counts = new Intl.NumberFormat(locale)

  function t(key: MessageKey, parts: MessageParts = {}): string {
    const found = lookUp(catalogue, key) ?? lookUp(en, key)
    if (found === undefined) return key
    return fillIn(typeof found === 'string' ? found : pluralForm(found, parts.count, plurals, key), parts, counts)
  }

  return { locale, t }
}

function lookUp(tree: MessageTree, key: string): string | MessageTree | undefined {
  let found: string | MessageTree | undefined = tree
  for (const part of key.split('.')) {
    if (found === undefined || typeof found === 'string') return undefined
    found = found[part]
  }
  return found
}

function pluralForm(
  forms: MessageTree,
  count: string | number | undefined,
  plurals: Intl.PluralRules,
  key: string,
): string {
  const chosen = (typeof count === 'number' ? forms[plurals.select(count)] : undefined) ?? forms.other
  return typeof chosen === 'string' ? chosen : key
}

function fillIn(text: string, parts: MessageParts, counts: Intl.NumberFormat): string {
  return text.replace(/\{(\w+)\}/g, (place, name: string) => {
    const part = parts[name]
    if (part === undefined) return place
    return name === 'count' && typeof part === 'number' ? counts.format(part) : String(part)
  })
}
