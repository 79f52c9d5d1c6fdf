/** Numbers from a seed: the same seed gives the same numbers on every machine. */
export interface SeededRandom {
  /** In [0, 1), 32 bits. */
  uniform(): number
  /** Standard normal. */
  normal(): number
}

/**
 * Small fast counter generator sfc32 of 128 bits of state, with normal draws by the polar method.
 *
 * @param seed whole number from 0 to 2³² − 1
 * @see Doty-Humphrey, C. (2010). PractRand, sfc32; Marsaglia, G. & Bray, T. A. (1964). SIAM Review 6, 260–264.
 * @example
 * seededRandom(7).uniform() === seededRandom(7).uniform() // => true
 */
export function seededRandom(seed: number): SeededRandom {
  let [a, b, c, counter] = [0x9e3779b9, 0x243f6a88, 0xb7e15162, seed >>> 0]
  let spare: number | null = null
  const uniform = () => {
    const mixed = (a + b + counter) | 0
    counter = (counter + 1) | 0
    a = b ^ (b >>> 9)
    b = (c + (c << 3)) | 0
    c = ((c << 21) | (c >>> 11)) + mixed
    return (mixed >>> 0) / 4_294_967_296
  }
  for (let warm = 0; warm < 15; warm++) uniform()
  const normal = (): number => {
    if (spare !== null) {
      const kept = spare
      spare = null
      return kept
    }
    for (;;) {
      const [x, y] = [2 * uniform() - 1, 2 * uniform() - 1]
      const square = x * x + y * y
      if (square === 0 || square >= 1) continue
      const scale = Math.sqrt((-2 * Math.log(square)) / square)
      spare = y * scale
      return x * scale
    }
  }
  return { uniform, normal }
}
