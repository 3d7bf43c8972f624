import { useEffect, useState } from 'react'
import { getSetting } from '../offline/settings.ts'

/** Whether the person at this device has stated to be qualified; undefined until that was looked up. */
export function useQualified(): boolean | undefined {
  const [qualified, setQualified] = useState<boolean>()
  useEffect(() => {
    let wanted = true
    getSetting('qualified').then(
      (stated) => wanted && setQualified(stated !== undefined),
      () => wanted && setQualified(false),
    )
    return () => {
      wanted = false
    }
  }, [])
  return qualified
}
