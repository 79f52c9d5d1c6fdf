import { describe, expect, it } from 'vitest'
import { createMessages } from '@/shared/messages/createMessages'
import { doubtSentence } from './doubtSentence'

const english = createMessages('en')
const say = (shares: Parameters<typeof doubtSentence>[0]): string =>
  doubtSentence(shares, english).replace(/\u00a0/g, ' ')

describe('doubtSentence', () => {
  it('names the two largest causes and what would narrow the first', () => {
    expect(say({ measurement: 0.22, factor: 0.61, lifetime: 0.07, chance: 0.1 })).toBe(
      'Most of the doubt comes from the material factors (61 %), then from floor areas and answers that are not known (22 %). Better factors would narrow it; more walking would not.',
    )
  })

  it('names one cause alone when the others add nothing', () => {
    expect(say({ measurement: 0, factor: 0, lifetime: 0, chance: 1 })).toContain('The doubt comes from chance')
  })

  it('does not call a run certain that carries no doubt', () => {
    expect(say({ measurement: 0, factor: 0, lifetime: 0, chance: 0 })).toContain('unknown, not as certain')
  })
})
