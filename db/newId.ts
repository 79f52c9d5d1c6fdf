let lastMs = 0
let counter = 0

/**
 * A UUID of version 7 (RFC 9562): grows with time, so that rows made together lie together. Nobody reads the time in it.
 *
 * @param nowMs clock of the device
 */
export function newId(nowMs = Date.now()): string {
  counter = nowMs === lastMs ? (counter + 1) & 0xfff : 0
  lastMs = nowMs
  const random = crypto.getRandomValues(new Uint8Array(8))
  random[0] = 0x80 | ((random[0] ?? 0) & 0x3f)
  const tail = Array.from(random, (byte) => byte.toString(16).padStart(2, '0')).join('')
  const time = nowMs.toString(16).padStart(12, '0').slice(-12)
  const version = `7${counter.toString(16).padStart(3, '0')}`
  return `${time.slice(0, 8)}-${time.slice(8)}-${version}-${tail.slice(0, 4)}-${tail.slice(4)}`
}
