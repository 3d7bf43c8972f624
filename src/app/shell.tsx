import { Outlet, ScrollRestoration, useLocation } from 'react-router-dom'
import { Toasts } from '../ui/toast.tsx'
import { DangerBar } from './danger-bar.tsx'
import { EditionBar } from './edition-bar.tsx'
import { LatePart } from './late-part.tsx'
import { Masthead } from './masthead.tsx'
import { usePageFocus } from './use-page-focus.ts'

/** What stands around every page. */
export function Shell() {
  usePageFocus()
  const front = useLocation().pathname === '/'
  return (
    <Toasts>
      <a className="skip" href="#main">
        Skip to the content
      </a>
      {front && <DangerBar />}
      <Masthead />
      <EditionBar />
      <LatePart />
      <Outlet />
      <ScrollRestoration />
    </Toasts>
  )
}
