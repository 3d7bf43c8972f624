import { useState } from 'react'
import { Link, useLocation } from 'react-router-dom'
import { reaches } from '../../server/people/roles.contract.ts'
import type { Role } from '../../server/people/roles.contract.ts'
import { useFollowPerson, useMe } from '../people/people.api.ts'
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
  ['/worksheets/bond-audit', 'Worksheets'],
  ['/editions', 'Editions'],
] as const
const forAdmins = [...forStaff, ['/shop/people', 'Our shop']] as const

function linksFor(role: Role | undefined) {
  if (role === undefined || !reaches(role, 'tech')) return forHomeowners
  return reaches(role, 'admin') ? forAdmins : forStaff
}

/** Sign in, or whose account this is. Where the session has ended with time, the way back in. */
function AccountLink() {
  const { known, person, expired } = useMe()
  const { pathname, search } = useLocation()
  if (!known) return null
  if (person === undefined || expired)
    return (
      <Link className="word-btn mast-me" to={`/sign-in?next=${encodeURIComponent(pathname + search)}`}>
        {expired ? 'Sign in again' : 'Sign in'}
      </Link>
    )
  return (
    <Link className="word-btn mast-me" to="/account" aria-label={`Account: ${person.name}`}>
      <span>{person.name}</span>
    </Link>
  )
}

const shared = /^\/(articles|causes|tests)\b/

/** Causes and tests are read among the articles, so they stand under that word too. */
const isUnder = (to: string, path: string) =>
  to === '/articles' ? shared.test(path) : path === to || path.startsWith(`${to}/`)

/** The head of every page: mark, ways to go, where what was typed lies, theme. On a phone they fold under "Menu". */
export function Masthead() {
  const { pathname } = useLocation()
  const [openAt, setOpenAt] = useState<string>()
  const links = linksFor(useMe().person?.role)
  useFollowPerson()
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
          <AccountLink />
          <ThemeButton />
        </div>
      </div>
    </header>
  )
}
