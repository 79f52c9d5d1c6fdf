import { useEffect, useState } from 'react'
import { useFieldOpening } from '@/sync/react/FieldProvider'

/** How many sheets are in the bag; 0 until the database is open. */
export function useWaitingSheets(): number {
  const opening = useFieldOpening()?.opening
  const store = opening?.kind === 'open' ? opening.field.store : null
  const [count, setCount] = useState(0)
  useEffect(() => {
    if (!store) return undefined
    const read = () =>
      void store.readBag().then(
        ({ sheetCount }) => setCount(sheetCount),
        () => undefined,
      )
    read()
    return store.subscribe(read)
  }, [store])
  return count
}
