import { describe, expect, it } from 'vitest'
import { sheetAnswers, type SheetAnswers } from '@/shared/schemas/sheet'
import { answersFromRegister } from './answersFromRegister'
import { sameAsLast } from './sameAsLast'
import { confirmedAnswers, unconfirmedAnswers, withoutMark } from './unconfirmedAnswers'
import { usableAnswers } from './usableAnswers'

const outline = { outlineId: '', reference: 'R-1', street: null, houseNumber: null, footprintM2: 80, blockId: null }
const register = { year: 1905, storeys: 3.2, heightM: null, use: null }
const mark = { knownBy: 'register', unconfirmed: 'register' } as const

describe('answersFromRegister', () => {
  it('offers what the register says, known by the register and marked', () => {
    expect(answersFromRegister({ ...outline, register })).toEqual({
      finding: { kind: 'standing', unconfirmed: 'register' },
      footprint: { footprintM2: 80, ...mark },
      storeys: { aboveGround: 3, ...mark },
      constructionYear: { kind: 'exact', year: 1905, ...mark },
    })
  })

  it('offers what the server takes, mark and all', () => {
    const offered = answersFromRegister({ ...outline, register })

    expect(sheetAnswers.parse(offered)).toEqual(offered)
  })
})

describe('unconfirmedAnswers', () => {
  it('names the groups nobody has confirmed, and none once they are', () => {
    const offered = answersFromRegister({ ...outline, register })
    const all = ['finding', 'footprint', 'storeys', 'constructionYear'] as const

    expect(Object.keys(unconfirmedAnswers(offered)).sort()).toEqual([...all].sort())
    expect(unconfirmedAnswers(confirmedAnswers(offered, all))).toEqual({})
  })
})

describe('confirmedAnswers', () => {
  it('says seen of what can be seen, and keeps how the rest is known', () => {
    const offered = answersFromRegister({ ...outline, register })

    expect(confirmedAnswers(offered, ['storeys', 'footprint', 'constructionYear'])).toEqual({
      storeys: { aboveGround: 3, knownBy: 'seen' },
      footprint: { footprintM2: 80, knownBy: 'register' },
      constructionYear: { kind: 'exact', year: 1905, knownBy: 'register' },
    })
  })
})

describe('withoutMark', () => {
  it('drops the mark and nothing else', () => {
    expect(withoutMark({ aboveGround: 3, ...mark })).toEqual({ aboveGround: 3, knownBy: 'register' })
  })
})

describe('sameAsLast', () => {
  const last: SheetAnswers = {
    use: { use: 'terraced', knownBy: 'seen' },
    storeys: { aboveGround: 2, knownBy: 'measured' },
    constructionYear: { kind: 'unknown' },
    condition: { condition: 'poor', knownBy: 'seen' },
    notes: { text: 'ask next door' },
  }

  it('fills what is not answered here, as a guess and marked', () => {
    expect(sameAsLast(last, { storeys: { aboveGround: 3, knownBy: 'register' } })).toEqual({
      use: { use: 'terraced', knownBy: 'guessed', unconfirmed: 'same-as-last' },
    })
  })
})

describe('usableAnswers', () => {
  it('leaves out what is only half typed', () => {
    const typed: SheetAnswers = { use: { use: 'hotel' }, storeys: { aboveGround: 0.2, knownBy: 'seen' } }

    expect(usableAnswers(typed)).toEqual({ use: { use: 'hotel' } })
  })
})
