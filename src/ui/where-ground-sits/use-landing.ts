import { useEffect, useRef, useState } from 'react'
import { onTheWay } from '../../../rules/triangle/landing.ts'
import type { Scene } from '../../../rules/triangle/scene.ts'

const landMs = 240
const slowDown = (part: number) => 1 - (1 - part) ** 3

/** The scene on its way to where it lands: 240 ms, or at once for whoever wants no motion. */
export function useLanding(target: Scene): Scene {
  const [shown, setShown] = useState(target)
  const last = useRef(target)
  // Scenes are made anew on every draw; only another drawing is worth a move.
  const key = JSON.stringify(target)
  const drawn = useRef(key)
  useEffect(() => {
    if (drawn.current === key) return
    drawn.current = key
    const from = last.current
    if (window.matchMedia('(prefers-reduced-motion: reduce)').matches) {
      last.current = target
      setShown(target)
      return
    }
    const begun = performance.now()
    let frame = requestAnimationFrame(function step(now) {
      const part = Math.min(1, (now - begun) / landMs)
      const scene = onTheWay(from, target, slowDown(Math.max(0, part)))
      last.current = scene
      setShown(scene)
      if (part < 1) frame = requestAnimationFrame(step)
    })
    return () => {
      cancelAnimationFrame(frame)
      last.current = target
    }
    // `target` belongs to `key`.
  }, [key])
  return shown
}
