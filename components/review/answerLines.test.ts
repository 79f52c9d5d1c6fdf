import { describe, expect, it } from 'vitest'
import type { ReviewSheet } from '@/shared/api/review'
import { messagesIn } from '@/shared/messages/languages'
import { answerLines } from './answerLines'

const sheetOf = (answers: ReviewSheet['answers']): ReviewSheet => ({
  sheetId: '019a0000-0000-7000-8000-000000000001',
  outlineId: null,
  reference: 'R-1',
  label: 'Kiln Road 1',
  state: 'handed-in',
  revision: 1,
  change: 1,
  flags: [],
  recordedByName: 'A. Surveyor',
  recordedAt: '2026-12-01T10:00:00.000Z',
  grossFloorAreaM2: 300,
  photoCount: 0,
  roundId: '019a0000-0000-7000-8000-000000000002',
  outline: null,
  geometry: null,
  answers,
  review: { state: 'handed-in', question: null, reviewedByName: null, reviewedAt: null },
  photos: [],
  conflicts: [],
  revisions: [],
})
const textOf = (answers: ReviewSheet['answers'], key: string) =>
  answerLines(sheetOf(answers), messagesIn('en')).find((line) => line.key === key)

describe('what a planner reads of a sheet', () => {
  it('holds further uses with their shares, and parts with their age and structure', () => {
    const answers: ReviewSheet['answers'] = {
      use: { use: 'retail', otherUses: [{ use: 'multi-family', share: 0.6 }], knownBy: 'seen' },
      parts: {
        parts: [
          {
            name: 'wing',
            footprintM2: 60,
            aboveGround: 1,
            use: null,
            structure: 'timber-frame',
            constructionYear: { kind: 'between', fromYear: 1980, toYear: 1989, knownBy: 'guessed' },
          },
        ],
      },
    }

    expect(textOf(answers, 'use')?.value).toMatch(/^shop; block of flats 60\s%$/)
    expect(textOf(answers, 'parts')?.value).toContain('timber frame, 1980–1989')
  })

  it('says what nobody has confirmed', () => {
    const known = textOf(
      { storeys: { aboveGround: 3, knownBy: 'register', unconfirmed: 'register' } },
      'storeys',
    )?.known

    expect(known).toBe('register, not confirmed')
  })

  it('leaves out what nobody answered, but for what every building has', () => {
    expect(textOf({}, 'roof')).toBeUndefined()
    expect(textOf({}, 'use')?.value).toBe('not answered')
  })
})
