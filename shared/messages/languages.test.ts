import { describe, expect, it } from 'vitest'
import { en } from './en'
import { firstSpoken, isLanguage, LANGUAGES, messagesIn } from './languages'
import type { MessageTree } from './messages.types'

const textsOf = (tree: MessageTree, path = ''): [string, string][] =>
  Object.entries(tree).flatMap(([part, value]) =>
    typeof value === 'string' ? [[path + part, value] as [string, string]] : textsOf(value, `${path}${part}.`),
  )
const placesOf = (text: string): string[] => [...text.matchAll(/\{(\w+)\}/g)].map(([, name = '']) => name).sort()

describe('languages', () => {
  it('takes the first of a list of wishes that it speaks, else English', () => {
    expect(firstSpoken(['gsw-CH', 'de-CH', 'en'])).toBe('de')
    expect(firstSpoken(['en-AU', 'de'])).toBe('en')
    expect(firstSpoken(['fr', 'pt-BR'])).toBe('en')
    expect(firstSpoken([])).toBe('en')
  })

  it('knows its own', () => {
    expect(['en', 'de', 'xx', 3].map(isLanguage)).toEqual([true, true, false, false])
  })

  it('gives the texts with the separators of the language', () => {
    expect(messagesIn('de').t('common.sheets', { count: 1200 })).toBe('1.200 Blätter')
    expect(messagesIn('en').t('common.sheets', { count: 1200 })).toBe('1,200 sheets')
  })

  it.each(Object.entries(LANGUAGES))(
    'says in %s everything that English says, with the same places',
    (_name, { catalogue }) => {
      const said = new Map(textsOf(catalogue))
      const wanted = textsOf(en)

      expect(wanted.filter(([key]) => !said.has(key)).map(([key]) => key)).toEqual([])
      expect([...said.keys()].filter((key) => !wanted.some(([known]) => known === key))).toEqual([])
      const differing = wanted.filter(
        ([key, text]) => !key.endsWith('.one') && String(placesOf(said.get(key) ?? '')) !== String(placesOf(text)),
      )
      expect(differing.map(([key]) => key)).toEqual([])
    },
  )
})
