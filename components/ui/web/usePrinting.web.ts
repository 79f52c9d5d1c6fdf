import { useEffect, useState } from 'react'
import { flushSync } from 'react-dom'

/** Whether the page is on its way to paper: from the browser's `beforeprint` to its `afterprint`. */
export function usePrinting(): boolean {
  const [isPrinting, setIsPrinting] = useState(false)

  useEffect(() => {
    // The browser takes its picture as soon as the listener returns, so the page must be drawn by then.
    const begin = (): void => flushSync(() => setIsPrinting(true))
    const end = (): void => setIsPrinting(false)
    window.addEventListener('beforeprint', begin)
    window.addEventListener('afterprint', end)
    return () => {
      window.removeEventListener('beforeprint', begin)
      window.removeEventListener('afterprint', end)
    }
  }, [])

  return isPrinting
}
