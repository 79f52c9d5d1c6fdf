import { describe, expect, it } from 'vitest'
import { planBatch, type BatchEntry, type BatchKnowledge, type KnownMutation } from './planBatch'

const work = (id: string, seq: number, sha256 = `of-${id}`): BatchEntry => ({ id, seq, sha256 })

/** What the server knows after it judged some mutations of this device, and others of other devices. */
function knowing(own: readonly BatchEntry[], others: readonly KnownMutation[] = []): BatchKnowledge {
  return {
    lastSeq: Math.max(0, ...own.map(({ seq }) => seq)),
    byId: new Map([...others, ...own].map((known) => [known.id, known])),
    bySeq: new Map(own.map((known) => [known.seq, known])),
  }
}

describe('plan of a batch', () => {
  it('P2 takes new work in the order of its numbers', () => {
    const plan = planBatch([work('c', 3), work('d', 4)], knowing([work('a', 1), work('b', 2)]))

    expect(plan).toEqual({ kind: 'go', steps: ['fresh', 'fresh'], lastSeq: 4 })
  })

  it('P2 answers work that came before as then, also in part of a batch', () => {
    const plan = planBatch([work('a', 1), work('b', 2), work('c', 3)], knowing([work('a', 1), work('b', 2)]))

    expect(plan).toEqual({ kind: 'go', steps: ['repeat', 'repeat', 'fresh'], lastSeq: 3 })
  })

  it.each([
    ['at its head', [work('d', 4)]],
    ['inside', [work('c', 3), work('e', 5)]],
  ])('P3 stops at a gap %s, and says which number it waits for', (_where, batch) => {
    const plan = planBatch(batch, knowing([work('a', 1), work('b', 2)]))

    expect(plan).toEqual({ kind: 'gap', expected: batch.length + 2 })
  })

  it.each([
    ['stands for other work', work('x', 2)],
    ['stands for the same id with another payload', work('b', 2, 'other')],
    ['is older than what is remembered', work('x', 0)],
  ])('P4 stops at a fork when a number %s', (_how, entry) => {
    expect(planBatch([entry], knowing([work('a', 1), work('b', 2)]))).toEqual({ kind: 'fork', expected: 3 })
  })

  it('P4 knows work again under the numbers of a newly enrolled device', () => {
    const plan = planBatch([work('a', 1), work('new', 2)], knowing([], [{ id: 'a', sha256: 'of-a' }]))

    expect(plan).toEqual({ kind: 'go', steps: ['renumbered', 'fresh'], lastSeq: 2 })
  })

  it('P5 sets apart an id that was used again for other work, the first time and each time after', () => {
    const known = knowing([], [{ id: 'a', sha256: 'of-a' }])
    const reused = work('a', 1, 'other')

    expect(planBatch([reused], known)).toEqual({ kind: 'go', steps: ['reused'], lastSeq: 1 })
    expect(planBatch([reused], { ...known, lastSeq: 1, bySeq: new Map([[1, reused]]) })).toEqual({
      kind: 'go',
      steps: ['reused'],
      lastSeq: 1,
    })
    expect(planBatch([work('b', 1), work('b', 2, 'other')], knowing([]))).toMatchObject({ steps: ['fresh', 'reused'] })
  })
})
