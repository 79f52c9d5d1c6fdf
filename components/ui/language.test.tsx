import { fireEvent, render, screen } from '@testing-library/react'
import { describe, expect, it } from 'vitest'
import { Button } from './Button'
import { LanguageProvider, useLanguageChoice } from './LanguageProvider'
import { useMessages } from './MessagesProvider'

function Chooser() {
  const { t } = useMessages()
  const { setLanguage } = useLanguageChoice()
  return <Button label={t('common.close')} onPress={() => setLanguage('de')} />
}

function memory() {
  const kept = new Map<string, string>()
  return {
    kept,
    getItem: (key: string) => kept.get(key) ?? null,
    setItem: (key: string, value: string) => void kept.set(key, value),
  }
}

describe('the language', () => {
  it('is what the device asks for until a person chooses, and the choice is kept', () => {
    const storage = memory()
    const { unmount } = render(
      <LanguageProvider storage={storage} wishes={['en-GB']}>
        <Chooser />
      </LanguageProvider>,
    )
    fireEvent.click(screen.getByRole('button', { name: 'Close' }))

    expect(screen.getByRole('button', { name: 'Schließen' })).toBeTruthy()
    expect(document.documentElement.lang).toBe('de')

    unmount()
    render(
      <LanguageProvider storage={storage} wishes={['en-GB']}>
        <Chooser />
      </LanguageProvider>,
    )
    expect(screen.getByRole('button', { name: 'Schließen' })).toBeTruthy()
  })

  it('is English where the device asks for none that is spoken', () => {
    render(
      <LanguageProvider storage={memory()} wishes={['fr-FR']}>
        <Chooser />
      </LanguageProvider>,
    )
    expect(screen.getByRole('button', { name: 'Close' })).toBeTruthy()
  })
})
