import { useEffect, useRef, useState } from 'react'

const settleMs = 400
/** What was typed reaches the disk a moment after the cursor has moved on; it still counts as moved on with it. */
const movedOnMs = 200

/**
 * A value that waits for 400 ms without a change, so that the drawing never jumps through 5 on the way to 57. When
 * `now` changes (another field, place or mode) it follows at once.
 */
export function useSettled<Value>(value: Value, now: string): Value {
  const [settled, setSettled] = useState(value)
  const key = JSON.stringify(value)
  const last = useRef({ now, key, movedAt: -Infinity })
  useEffect(() => {
    if (last.current.key === key && last.current.now === now) return
    const movedAt = last.current.now === now ? last.current.movedAt : performance.now()
    const atOnce = performance.now() - movedAt < movedOnMs
    last.current = { now, key, movedAt }
    const timer = setTimeout(() => setSettled(value), atOnce ? 0 : settleMs)
    return () => clearTimeout(timer)
    // `value` belongs to `key`.
  }, [key, now])
  return settled
}
