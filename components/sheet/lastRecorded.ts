const KEY = 'tallystone.lastRecorded'
let inMemory: string | null = null

/** The building whose sheet was put in the bag last on this device; lost with the browser's storage, which does no harm. */
export function lastRecorded(): string | null {
  try {
    return globalThis.localStorage?.getItem(KEY) ?? inMemory
  } catch {
    return inMemory
  }
}

/** Notes the building that was recorded just now. */
export function noteLastRecorded(buildingId: string): void {
  inMemory = buildingId
  try {
    globalThis.localStorage?.setItem(KEY, buildingId)
  } catch {
    // forbidden storage: it lasts as long as the app then
  }
}
