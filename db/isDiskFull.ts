/** Whether a fault of the disk says that there is no room: by its name in browsers, by its words in SQLite. */
export function isDiskFull(error: unknown): boolean {
  const text = error instanceof Error ? `${error.name} ${error.message}` : String(error)
  return /quota|disk is full|SQLITE_FULL|SQLITE_IOERR|disk I\/O error|ENOSPC/i.test(text)
}
