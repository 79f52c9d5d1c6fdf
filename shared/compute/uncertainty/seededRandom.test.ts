import { expect, it } from 'vitest'
import { seededRandom } from './seededRandom'

/** First numbers of PractRand 0.94, RNGs::Raw::sfc32, as the tests of Apache Commons RNG hold them. */
const PUBLISHED = [
  0x89b5c414, 0x7ee57639, 0xdbe18f7b, 0x94aa0162, 0xa22bff0a, 0x21c91fb8, 0x2c6fd6fe, 0xcda90d13, 0x019684ca,
  0xe5b400c0, 0x459d8590, 0x3aec0a1e, 0x254dac77, 0xbe10ae80, 0x9ac27819, 0xd17d10c6, 0x71a69026, 0x4bb2bdda,
  0x70853646, 0xda28f272, 0x879200d9, 0x8c2f8b5b, 0x8a87cb78, 0x27ffdced, 0x988a2b7b, 0xf220ef9b, 0x13b8984f,
  0x345d1732, 0x8f5bc6fc, 0x092b09ff, 0x046bd2b0, 0xa5a99fc5, 0x19400604, 0xb76e7394, 0x037addd5, 0xe916ed79,
  0x94f10dc6, 0xf2ecb45e, 0x69834355, 0xb814aeb2,
]
const DRAWS = 200_000

it('gives the published numbers for the published seed', () => {
  const random = seededRandom([0xbb3c4104, 0x02294965, 0xda1ce2a9])

  expect(PUBLISHED.map(() => random.uniform() * 2 ** 32)).toEqual(PUBLISHED)
})

it('gives the same numbers for the same seed and others for the next', () => {
  const draw = (seed: number) =>
    Array.from(
      { length: 20 },
      (
        (random) => () =>
          random.normal()
      )(seededRandom(seed)),
    )

  expect(draw(5)).toEqual(draw(5))
  expect(draw(5)).not.toEqual(draw(6))
})

it('draws uniform numbers with the mean and variance of their law, unrelated between neighbouring seeds', () => {
  const [one, other] = [seededRandom(1), seededRandom(2)]
  let [mean, square, product] = [0, 0, 0]
  for (let draw = 0; draw < DRAWS; draw++) {
    const [u, v] = [one.uniform() - 0.5, other.uniform() - 0.5]
    mean += u / DRAWS
    square += (u * u) / DRAWS
    product += (u * v) / DRAWS
  }

  expect(Math.abs(mean)).toBeLessThan(4 * Math.sqrt(1 / 12 / DRAWS))
  expect(Math.abs(square - 1 / 12)).toBeLessThan(4 * Math.sqrt(1 / 180 / DRAWS))
  expect(Math.abs(product)).toBeLessThan(4 / 12 / Math.sqrt(DRAWS))
})

it('draws normal numbers with the first four moments of their law', () => {
  const random = seededRandom(3)
  const moments = [0, 0, 0, 0]
  for (let draw = 0; draw < DRAWS; draw++) {
    const z = random.normal()
    moments.forEach((_, power) => (moments[power]! += z ** (power + 1) / DRAWS))
  }

  const [first, second, third, fourth] = moments
  expect(Math.abs(first!)).toBeLessThan(4 / Math.sqrt(DRAWS))
  expect(Math.abs(second! - 1)).toBeLessThan(4 * Math.sqrt(2 / DRAWS))
  expect(Math.abs(third!)).toBeLessThan(4 * Math.sqrt(15 / DRAWS))
  expect(Math.abs(fourth! - 3)).toBeLessThan(4 * Math.sqrt(96 / DRAWS))
})

it.each([-1, 0.5, 2 ** 32, NaN])('refuses the seed %s', (seed) => {
  expect(() => seededRandom(seed)).toThrow('parameter-out-of-range')
})
