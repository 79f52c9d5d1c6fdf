const listeners = new Set<() => void>()
let isBusy = false

/** Whether a bag is on its way just now; outside React, because what asks stands above the field. */
export const handInBusy = {
  get: () => isBusy,
  set(next: boolean) {
    if (next === isBusy) return
    isBusy = next
    listeners.forEach((listener) => listener())
  },
  subscribe(listener: () => void) {
    listeners.add(listener)
    return () => listeners.delete(listener)
  },
}
