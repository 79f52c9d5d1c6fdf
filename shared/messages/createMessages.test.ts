import { describe, expect, it } from 'vitest'
import {
  AREA_BASES,
  COMPONENTS,
  MATERIAL_GROUPS,
  MATERIALS,
  PERIOD_IDS,
  PROVENANCES,
  STRUCTURES,
  USES,
} from '@/shared/compute/factors/vocabulary'
import { ROLES } from '@/shared/schemas/person'
import { CONDITIONS, DEVICE_SHEET_STATES, KNOWN_BY, PHOTO_TAGS, VACANCIES } from '@/shared/schemas/sheet'
import { createMessages } from './createMessages'
import { en } from './en'
import type { MessageKey, MessageTree } from './messages.types'

describe('createMessages', () => {
  it('finds a text by its dotted key', () => {
    expect(createMessages('en').t('common.cancel')).toBe('Cancel')
  })

  it('chooses the plural form by the language and writes the count with its separators', () => {
    const german = { common: { sheets: { one: '{count} Blatt', other: '{count} Blätter' } } }

    expect(createMessages('en').t('common.sheets', { count: 1 })).toBe('1 sheet')
    expect(createMessages('en').t('common.sheets', { count: 1200 })).toBe('1,200 sheets')
    expect(createMessages('de', german).t('common.sheets', { count: 1200 })).toBe('1.200 Blätter')
  })

  it('uses every plural form a language has', () => {
    const polish = { common: { sheets: { one: 'arkusz', few: 'arkusze', many: 'arkuszy', other: 'arkusza' } } }
    const { t } = createMessages('pl', polish)

    expect([1, 2, 5].map((count) => t('common.sheets', { count }))).toEqual(['arkusz', 'arkusze', 'arkuszy'])
  })

  it('leaves a year as it is', () => {
    expect(createMessages('en').t('common.map.position', { distance: 2026 })).toContain('2026')
  })

  it('falls back on English where a language has no text yet', () => {
    expect(createMessages('de', { common: { cancel: 'Abbrechen' } }).t('common.close')).toBe('Close')
  })

  it('shows the key when there is no text, and the place when there is no part', () => {
    const { t } = createMessages('en')

    expect(t('common.nowhere' as MessageKey)).toBe('common.nowhere')
    expect(t('common.chosenFile')).toBe('Chosen: {name}')
  })
})

describe('English catalogue', () => {
  it.each([
    ['use', [...USES, 'unknown']],
    ['structure', [...STRUCTURES, 'unknown']],
    ['material', MATERIALS],
    ['materialGroup', MATERIAL_GROUPS],
    ['period', [...PERIOD_IDS, 'unknown']],
    ['component', COMPONENTS],
    ['condition', CONDITIONS],
    ['vacancy', VACANCIES],
    ['knownBy', KNOWN_BY],
    ['state', DEVICE_SHEET_STATES],
    ['photoTag', PHOTO_TAGS],
    ['role', ROLES],
    ['provenance', PROVENANCES],
    ['areaBasis', AREA_BASES],
  ] as const)('names every word of %s', (group, words) => {
    expect(Object.keys(en.vocabulary[group]).sort()).toEqual([...words].sort())
  })

  it('holds only filled texts, and plural forms always in pairs', () => {
    const faults: string[] = []
    const visit = (tree: MessageTree, path: string): void => {
      if ('one' in tree && typeof tree.other !== 'string') faults.push(`${path} lacks its other form`)
      for (const [part, value] of Object.entries(tree)) {
        if (typeof value !== 'string') visit(value, `${path}.${part}`)
        else if (value.trim() === '') faults.push(`${path}.${part} is empty`)
      }
    }

    visit(en, 'en')

    expect(faults).toEqual([])
  })
})
