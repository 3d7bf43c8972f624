import { useEffect, useRef } from 'react'
import { useLocation } from 'react-router-dom'

const patienceMs = 4000

/** Whether the focus still lies where the last page left it: nowhere, or on what led here. */
const untouched = (leftAt: Element | null): boolean => {
  const at = document.activeElement
  return at === null || at === document.body || at === leftAt
}

function focusHeading(): boolean {
  const heading = document.querySelector<HTMLElement>('#main h1')
  if (heading === null) return false
  heading.setAttribute('tabindex', '-1')
  heading.focus({ preventScroll: true })
  return true
}

/**
 * Moves the focus to the new page's heading after a navigation, so that a reader starts there. Not on first load. A
 * page that must first look on the device draws its heading a little later, so it is waited for.
 */
export function usePageFocus(): void {
  const { pathname } = useLocation()
  const before = useRef(pathname)
  useEffect(() => {
    if (before.current === pathname) return
    before.current = pathname
    if (document.getElementById('main')?.contains(document.activeElement) === true) return
    if (focusHeading()) return
    const leftAt = document.activeElement
    const seen = new MutationObserver(() => {
      if (!untouched(leftAt) || focusHeading()) seen.disconnect()
    })
    seen.observe(document.body, { childList: true, subtree: true })
    const timer = setTimeout(() => seen.disconnect(), patienceMs)
    return () => {
      clearTimeout(timer)
      seen.disconnect()
    }
  }, [pathname])
}
