import { useEffect, useState } from 'react'
import { listSheets, onSheetsChanged } from './sheets.ts'

/** How many sheets lie on this device; undefined until it was counted, or where the device keeps nothing. */
export function useSheetCount(): number | undefined {
  const [count, setCount] = useState<number>()
  useEffect(() => {
    let wanted = true
    const read = () =>
      void listSheets().then(
        (sheets) => wanted && setCount(sheets.length),
        () => wanted && setCount(undefined),
      )
    read()
    const stop = onSheetsChanged(read)
    return () => {
      wanted = false
      stop()
    }
  }, [])
  return count
}
