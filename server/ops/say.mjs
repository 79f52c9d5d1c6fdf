const STILL_MS = 20_000

/** One line of progress. */
export function say(words) {
  console.log(words)
}

/**
 * Runs one step of the work: says what it is, a sign of life while it lasts, and how long it took.
 *
 * @template Result
 * @param {string} words what is being done, e.g. `Installing packages`
 * @param {() => Promise<Result>} work
 * @returns {Promise<Result>}
 */
export async function step(words, work) {
  const startMs = performance.now()
  const seconds = () => Math.round((performance.now() - startMs) / 1_000)
  say(`· ${words} …`)
  const stillThere = setInterval(() => say(`  ${words}: still at it, ${seconds()} s`), STILL_MS)
  try {
    const result = await work()
    if (seconds() >= 2) say(`  ${words}: done in ${seconds()} s`)
    return result
  } finally {
    clearInterval(stillThere)
  }
}
