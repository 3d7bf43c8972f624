import { useEffect } from 'react'

/** Names the page in the tab and in the history: "Articles · Tracelamp". Call it once on every page. */
export function usePageTitle(title: string): void {
  useEffect(() => {
    document.title = `${title} · Tracelamp`
  }, [title])
}
