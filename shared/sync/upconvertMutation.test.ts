import { expect, it } from 'vitest'
import { upconvertMutation } from './upconvertMutation'

const steps = {
  1: (payload: object) => ({ ...payload, renamed: 1 }),
  2: (payload: object) => ({ ...payload, split: Reflect.get(payload, 'renamed') }),
}

it('F20 takes a mutation through every version between, and leaves the one in the bag as it is', () => {
  const old = Object.freeze({ id: 'a' })

  expect(upconvertMutation(old, 1, steps, 3)).toEqual({ id: 'a', renamed: 1, split: 1 })
  expect(upconvertMutation({ id: 'a', renamed: 7 }, 2, steps, 3)).toEqual({ id: 'a', renamed: 7, split: 7 })
  expect(upconvertMutation(old, 3, steps, 3)).toBe(old)
  expect(upconvertMutation(old, 1)).toBe(old)
})
