import type { Stamp } from './appendMutation'
import type { Driver, Statements } from './driver.types'
import { isDiskFull } from './isDiskFull'
import type { Twin, TwinEntry } from './twin.types'

export type SaveSafely = <Result>(work: (inside: Statements, stamp: Stamp) => Promise<Result>) => Promise<Result>

/**
 * One transaction that is tried again on space that was held back when the disk is full, and whose mutations are then
 * written a second time outside the database.
 *
 * @throws whatever the work throws, after everything was rolled back
 */
export function saveSafely(driver: Driver, twin: Twin, stamp: Stamp): SaveSafely {
  return async (work) => {
    let appended: TwinEntry[] = []
    const attempt = () => {
      appended = []
      const own: Stamp = { ...stamp, onAppended: (entry) => appended.push(entry) }
      return driver.transaction((inside) => work(inside, own))
    }
    const result = await attempt().catch(async (error: unknown) => {
      if (!isDiskFull(error) || !(await twin.dropBallast())) throw error
      return attempt()
    })
    // The save has succeeded; a twin that could not follow is brought level when the database is opened again.
    if (appended.length > 0) await twin.put(appended).catch(() => undefined)
    return result
  }
}
