import { useEffect, useState } from 'react'
import { Link, useLocation } from 'react-router-dom'
import { getSetting } from '../offline/settings.ts'
import { Icon } from '../ui/icon.tsx'
import { Mark } from './mark.tsx'
import { SavingWord } from './saving-word.tsx'
import { ThemeButton } from './theme-button.tsx'

const forHomeowners = [
  ['/check', 'Check my power'],
  ['/articles', 'Articles'],
] as const
const forStaff = [
  ['/diagnosis', 'Diagnosis'],
  ['/articles', 'Articles'],
  ['/editions', 'Editions'],
] as const

const staffOnly = /^\/(diagnosis|editions)\b/
const shared = /^\/(articles|causes|tests)\b/

/** Whose masthead a page carries. Pages both read follow what this device's person stated. */
function useStaff(path: string): boolean {
  const [qualified, setQualified] = useState(false)
  useEffect(() => {
    let wanted = true
    getSetting('qualified').then(
      (stated) => wanted && setQualified(stated !== undefined),
      () => {},
    )
    return () => {
      wanted = false
    }
  }, [path])
  return staffOnly.test(path) || (shared.test(path) && qualified)
}

/** Causes and tests are read among the articles, so they stand under that word too. */
const isUnder = (to: string, path: string) =>
  to === '/articles' ? shared.test(path) : path === to || path.startsWith(`${to}/`)

/** The head of every page: mark, ways to go, where what was typed lies, theme. On a phone they fold under "Menu". */
export function Masthead() {
  const { pathname } = useLocation()
  const [openAt, setOpenAt] = useState<string>()
  const links = useStaff(pathname) ? forStaff : forHomeowners
  const open = openAt === pathname
  return (
    <header
      className={`mast ${pathname === '/' ? 'mast-front' : ''}`}
      onKeyDown={(event) => event.key === 'Escape' && setOpenAt(undefined)}
    >
      <div className="mast-in">
        <Link className="mark" to="/">
          <Mark />
          Tracelamp
        </Link>
        <SavingWord />
        <button
          type="button"
          className="word-btn mast-toggle"
          aria-expanded={open}
          aria-controls="mast-panel"
          onClick={() => setOpenAt(open ? undefined : pathname)}
        >
          <Icon name={open ? 'close' : 'menu'} />
          Menu
        </button>
        <div className="mast-panel" id="mast-panel" data-open={open}>
          <nav aria-label="Main">
            {links.map(([to, words]) => (
              <Link key={to} to={to} aria-current={isUnder(to, pathname) ? 'page' : undefined}>
                {words}
              </Link>
            ))}
          </nav>
          <ThemeButton />
        </div>
      </div>
    </header>
  )
}
