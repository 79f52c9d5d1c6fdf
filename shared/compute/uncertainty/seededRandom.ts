import { ComputeError } from '@/shared/compute/errors'

/** Numbers from a seed: the same seed gives the same numbers on every machine. */
export interface SeededRandom {
  /** In [0, 1), a multiple of 2⁻³². */
  uniform(): number
  /** Standard normal. */
  normal(): number
}

/** Words beside a seed of one number: the first digits of π and e. */
const SECOND_WORD = 0x243f6a88
const THIRD_WORD = 0xb7e15162
const WARM_UP_ROUNDS = 15

/**
 * Small fast counting generator sfc32 with 128 bits of state, with normal draws by the polar method. Not for secrets.
 *
 * @param seed whole number from 0 to 2³² − 1, or the three words of the published seeding
 * @throws {ComputeError} `parameter-out-of-range` for any other number
 * @remarks period at least 2³², on average 2¹²⁷; checked against the first 40 numbers of PractRand 0.94
 * @see Doty-Humphrey, C. (2014). PractRand 0.94, RNGs::Raw::sfc32; Marsaglia, G. & Bray, T. A. (1964). A convenient
 *   method for generating normal variables. SIAM Review 6, 260–264.
 * @example
 * seededRandom([0xbb3c4104, 0x02294965, 0xda1ce2a9]).uniform() * 2 ** 32 // => 0x89b5c414
 * seededRandom(7).normal() === seededRandom(7).normal() // => true
 */
export function seededRandom(seed: number | readonly [number, number, number]): SeededRandom {
  let [a, b, c] = typeof seed === 'number' ? [seed, SECOND_WORD, THIRD_WORD] : seed
  if (![a, b, c].every((word) => Number.isInteger(word) && word >= 0 && word < 2 ** 32))
    throw new ComputeError('parameter-out-of-range', { seed })
  let counter = 1
  let spare: number | null = null
  const uniform = (): number => {
    const mixed = (a + b + counter) | 0
    counter = (counter + 1) | 0
    a = b ^ (b >>> 9)
    b = (c + (c << 3)) | 0
    c = (((c << 21) | (c >>> 11)) + mixed) | 0
    return (mixed >>> 0) / 4_294_967_296
  }
  for (let round = 0; round < WARM_UP_ROUNDS; round++) uniform()
  const normal = (): number => {
    if (spare !== null) {
      const kept = spare
      spare = null
      return kept
    }
    for (;;) {
      const x = 2 * uniform() - 1
      const y = 2 * uniform() - 1
      const square = x * x + y * y
      if (square === 0 || square >= 1) continue
      const scale = Math.sqrt((-2 * Math.log(square)) / square)
      spare = y * scale
      return x * scale
    }
  }
  return { uniform, normal }
}
