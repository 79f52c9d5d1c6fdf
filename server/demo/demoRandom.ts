import { createHash } from 'node:crypto'
import type { Random } from './town.types'

/**
 * Numbers for the invented town, the same for the same name: Mulberry32 over a digest of the name.
 * For drawing a demo only; computations have their own generator.
 */
export function demoRandom(name: string): Random {
  let state = createHash('sha256').update(`saltmarsh hythe/${name}`).digest().readUInt32LE(0)
  return {
    next() {
      state = (state + 0x6d2b79f5) >>> 0
      let mixed = Math.imul(state ^ (state >>> 15), state | 1)
      mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)
      return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296
    },
  }
}
