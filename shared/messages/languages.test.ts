import { describe, expect, it } from 'vitest'
import { firstSpoken, isLanguage, messagesIn } from './languages'

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
})
