import type { ReactNode } from 'react'
import { usePageTitle } from './page-title.ts'

type PageProps = {
  /** Names the tab; the page's own h1 stands in its content. */
  title: string
  /** `text`: a column of 720 px, for questions. `page`: up to 1240 px. `none`: the page draws its own width. */
  width?: 'text' | 'page' | 'none'
  className?: string
  children: ReactNode
}

/**
 * The main content of a page. Every page is one of these, with one h1; a Dock follows it. After a navigation the
 * shell moves the focus to the h1.
 */
export function Page({ title, width = 'page', className = '', children }: PageProps) {
  usePageTitle(title)
  const column = width === 'none' ? '' : `page-column ${width === 'text' ? 'page-text' : ''}`
  return (
    <main id="main" tabIndex={-1} className={`${column} ${className}`}>
      {children}
    </main>
  )
}
