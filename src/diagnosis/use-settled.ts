import { useEffect, useRef, useState } from 'react'

const settleMs = 400

/**
 * A value that waits for 400 ms without a change, so that the drawing never jumps through 5 on the way to 57. When
 * `now` changes (another field, place or mode) it follows at once.
 */
export function useSettled<Value>(value: Value, now: string): Value {
  const [settled, setSettled] = useState(value)
  const key = JSON.stringify(value)
  const last = useRef({ now, key })
  useEffect(() => {
    if (last.current.key === key && last.current.now === now) return
    const atOnce = last.current.now !== now
    last.current = { now, key }
    const timer = setTimeout(() => setSettled(value), atOnce ? 0 : settleMs)
    return () => clearTimeout(timer)
    // `value` belongs to `key`.
  }, [key, now])
  return settled
}
