import { Link } from 'react-router-dom'
import { Icon } from '../ui/icon.tsx'

/** Above everything on the front page: for whoever is in danger now, one press to what to do. */
export function DangerBar() {
  return (
    <aside aria-label="Danger">
      <Link className="danger-bar" to="/check/stop">
        <span className="danger-bar-word">
          <svg viewBox="0 0 28 26" aria-hidden="true" focusable="false">
            <path d="M14 1.5L27 24.5H1z" fill="#fff" stroke="#fff" strokeWidth="2" strokeLinejoin="round" />
            <path d="M12.4 9h3.2l-.7 8.2h-1.8z" fill="var(--z-danger)" />
            <circle cx="14" cy="20.6" r="1.8" fill="var(--z-danger)" />
          </svg>
          DANGER
        </span>
        <b>Burnt smell, a shock, a hot outlet cover, metal that tingles?</b>
        <span className="danger-bar-do">
          What to do now <Icon name="next" />
        </span>
      </Link>
    </aside>
  )
}
