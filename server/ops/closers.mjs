const PARENT_POLL_MS = 500

/**
 * What has to be ended when the program ends, for whatever reason; last opened, first closed.
 *
 * @returns {{ add(close: () => Promise<void> | void): void, closeAll(): Promise<void>, onSignal(stop: () => void): void }}
 */
export function makeClosers() {
  const open = []
  let closing
  const closeAll = () => {
    closing ??= (async () => {
      for (let close = open.pop(); close; close = open.pop()) {
        await Promise.resolve()
          .then(close)
          .catch((error) => console.error(error.message))
      }
    })()
    return closing
  }
  return {
    add: (close) => open.push(close),
    closeAll,
    onSignal(stop) {
      for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, stop)
      if (process.env.npm_lifecycle_event) onOrphaned(stop)
    },
  }
}

/** npm starts us through a shell, which does not pass a signal on: when it is gone, so is whoever wanted us. */
function onOrphaned(stop) {
  const parent = process.ppid
  const watch = setInterval(() => {
    if (process.ppid === parent) return
    clearInterval(watch)
    stop()
  }, PARENT_POLL_MS)
  watch.unref()
}
