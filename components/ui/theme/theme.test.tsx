import { act, renderHook } from '@testing-library/react'
import { createElement, type ReactNode } from 'react'
import { describe, expect, it } from 'vitest'
import { contrastRatio } from './contrastRatio'
import type { ChoiceStorage } from './deviceStorage'
import { ThemeProvider, useTheme, useThemeChoice } from './ThemeProvider'
import { TEXT_PAIRS, THEMES } from './tokens'

describe('contrastRatio', () => {
  it('is 21 for black on white and 1 for a colour on itself', () => {
    expect(contrastRatio('#000000', '#FFFFFF')).toBeCloseTo(21, 10)
    expect(contrastRatio('#96381F', '#96381F')).toBe(1)
  })

  it('refuses what is not written as #RRGGBB', () => {
    expect(() => contrastRatio('red', '#FFFFFF')).toThrow(RangeError)
  })
})

describe.each(Object.values(THEMES))('theme $name', ({ colours, isBrightSun }) => {
  it.each(TEXT_PAIRS)('keeps %s readable on %s', (text, ground) => {
    expect(contrastRatio(colours[text], colours[ground])).toBeGreaterThanOrEqual(isBrightSun ? 7 : 4.5)
  })

  it('draws frames of fields and rules at 3 to 1 or more', () => {
    for (const ground of ['ground', 'panel', 'field'] as const) {
      expect(contrastRatio(colours.rule, colours[ground])).toBeGreaterThanOrEqual(3)
      expect(contrastRatio(colours.selection, colours[ground])).toBeGreaterThanOrEqual(3)
    }
  })
})

describe('ThemeProvider', () => {
  const storageHolding = (first: string | null): ChoiceStorage & { kept: () => string | null } => {
    let value = first
    return { getItem: () => value, setItem: (_key, next) => void (value = next), kept: () => value }
  }
  const render = (storage: ChoiceStorage) =>
    renderHook(() => ({ theme: useTheme(), choice: useThemeChoice() }), {
      wrapper: ({ children }: { children: ReactNode }) => createElement(ThemeProvider, { storage, children }),
    })

  it('follows the choice and keeps it', () => {
    const storage = storageHolding(null)
    const { result } = render(storage)

    act(() => result.current.choice.setLook('night'))
    act(() => result.current.choice.setBrightSun(true))

    expect(result.current.theme.name).toBe('night-sun')
    expect(render(storage).result.current.theme.name).toBe('night-sun')
  })

  it('colours the page with its ground', () => {
    const { result } = render(storageHolding(null))

    act(() => result.current.choice.setLook('night'))

    expect(document.querySelector<HTMLMetaElement>('meta[name="theme-color"]')?.content).toBe('#20292E')
  })

  it('is limewash on paper, whatever the choice', () => {
    const { result } = render(storageHolding('{"look":"night"}'))
    expect(result.current.theme.name).toBe('night')

    act(() => void window.dispatchEvent(new Event('beforeprint')))
    expect(result.current.theme.name).toBe('limewash')

    act(() => void window.dispatchEvent(new Event('afterprint')))
    expect(result.current.theme.name).toBe('night')
  })

  it.each(['{', 'null', '{"look":"plaid"}', '7'])('starts with the plain look when what was kept is %s', (kept) => {
    expect(render(storageHolding(kept)).result.current.theme.name).toBe('limewash')
  })
})
