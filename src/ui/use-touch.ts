import { useSyncExternalStore } from 'react'

const coarse = () => window.matchMedia('(pointer: coarse)')

/** Whether fingers do the pointing here: then our own pad rises instead of the system's keyboard. */
export const useTouch = (): boolean =>
  useSyncExternalStore(
    (changed) => {
      const query = coarse()
      query.addEventListener('change', changed)
      return () => query.removeEventListener('change', changed)
    },
    () => coarse().matches,
    () => false,
  )
