/** What a device must hold when it has pulled everything (rule L6). */
export interface SyncDigest {
  readonly count: number
  /** 16 hexadecimal digits. */
  readonly xor64: string
}

/** One thing of the beats as the device holds it: its id and its change number. */
export interface DigestEntry {
  readonly id: string
  readonly change: number
}

/**
 * Count and XOR of the first 64 bits of SHA-256(id ‖ ':' ‖ change) over all entries, in any order. Adding an entry
 * twice takes it out again, so a device can keep the XOR as it goes along.
 *
 * @param entries ids as lower-case UUIDs, changes as whole numbers ≥ 0
 */
export function syncDigest(entries: Iterable<DigestEntry>): SyncDigest {
  let count = 0
  let high = 0
  let low = 0
  for (const { id, change } of entries) {
    const [entryHigh, entryLow] = first64BitsOfSha256(`${id}:${change}`)
    high ^= entryHigh
    low ^= entryLow
    count += 1
  }
  return { count, xor64: hex(high) + hex(low) }
}

function hex(word: number): string {
  return (word >>> 0).toString(16).padStart(8, '0')
}

const LONGEST = 55
const schedule = new Int32Array(64)

/**
 * SHA-256 of one block, written out so that phone and server need no asynchronous call per entry.
 *
 * @param text ASCII, at most 55 characters: it fits one block
 */
function first64BitsOfSha256(text: string): readonly [number, number] {
  if (text.length > LONGEST) throw new RangeError('an entry of a digest fits one block')
  fillSchedule(text)
  const [a, b] = compress()
  return [a, b]
}

function fillSchedule(text: string): void {
  schedule.fill(0, 0, 16)
  for (let index = 0; index < text.length; index += 1) {
    schedule[index >> 2]! |= (text.charCodeAt(index) & 0xff) << (24 - (index & 3) * 8)
  }
  schedule[text.length >> 2]! |= 0x80 << (24 - (text.length & 3) * 8)
  schedule[15] = text.length * 8
  for (let index = 16; index < 64; index += 1) {
    const before2 = schedule[index - 2]!
    const before15 = schedule[index - 15]!
    const s1 = rotate(before2, 17) ^ rotate(before2, 19) ^ (before2 >>> 10)
    const s0 = rotate(before15, 7) ^ rotate(before15, 18) ^ (before15 >>> 3)
    schedule[index] = s1 + schedule[index - 7]! + s0 + schedule[index - 16]!
  }
}

function compress(): [number, number] {
  let [a, b, c, d, e, f, g, h] = START
  for (let index = 0; index < 64; index += 1) {
    const s1 = rotate(e, 6) ^ rotate(e, 11) ^ rotate(e, 25)
    const t1 = (h + s1 + ((e & f) ^ (~e & g)) + ROUND[index]! + schedule[index]!) | 0
    const t2 = ((rotate(a, 2) ^ rotate(a, 13) ^ rotate(a, 22)) + ((a & b) ^ (a & c) ^ (b & c))) | 0
    h = g
    g = f
    f = e
    e = (d + t1) | 0
    d = c
    c = b
    b = a
    a = (t1 + t2) | 0
  }
  return [(START[0] + a) | 0, (START[1] + b) | 0]
}

function rotate(word: number, bits: number): number {
  return (word >>> bits) | (word << (32 - bits))
}

const START: readonly [number, number, number, number, number, number, number, number] = [
  0x6a09e667, 0xbb67ae85, 0x3c6ef372, 0xa54ff53a, 0x510e527f, 0x9b05688c, 0x1f83d9ab, 0x5be0cd19,
]

const ROUND = Int32Array.from([
  0x428a2f98, 0x71374491, 0xb5c0fbcf, 0xe9b5dba5, 0x3956c25b, 0x59f111f1, 0x923f82a4, 0xab1c5ed5, 0xd807aa98,
  0x12835b01, 0x243185be, 0x550c7dc3, 0x72be5d74, 0x80deb1fe, 0x9bdc06a7, 0xc19bf174, 0xe49b69c1, 0xefbe4786,
  0x0fc19dc6, 0x240ca1cc, 0x2de92c6f, 0x4a7484aa, 0x5cb0a9dc, 0x76f988da, 0x983e5152, 0xa831c66d, 0xb00327c8,
  0xbf597fc7, 0xc6e00bf3, 0xd5a79147, 0x06ca6351, 0x14292967, 0x27b70a85, 0x2e1b2138, 0x4d2c6dfc, 0x53380d13,
  0x650a7354, 0x766a0abb, 0x81c2c92e, 0x92722c85, 0xa2bfe8a1, 0xa81a664b, 0xc24b8b70, 0xc76c51a3, 0xd192e819,
  0xd6990624, 0xf40e3585, 0x106aa070, 0x19a4c116, 0x1e376c08, 0x2748774c, 0x34b0bcb5, 0x391c0cb3, 0x4ed8aa4a,
  0x5b9cca4f, 0x682e6ff3, 0x748f82ee, 0x78a5636f, 0x84c87814, 0x8cc70208, 0x90befffa, 0xa4506ceb, 0xbef9a3f7,
  0xc67178f2,
])
