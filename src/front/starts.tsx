import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { Icon } from '../ui/icon.tsx'
import { TesterLamp } from '../ui/tester-lamp.tsx'

function Drawing({ path }: { path: string }) {
  return (
    <svg className="tester-lamp" viewBox="0 0 44 44" aria-hidden="true" focusable="false">
      <path d={path} />
    </svg>
  )
}

const meter = 'M10 4h24v36H10zM15 9h14v9H15zM28 29a6 6 0 1 1-12 0 6 6 0 0 1 12 0zM22 29l3-4'
const eye = 'M4 22q18-22 36 0q-18 22-36 0zM28 22a6 6 0 1 1-12 0 6 6 0 0 1 12 0z'

const starts: readonly { have: string; title: string; note: string; mark: ReactNode }[] = [
  {
    have: 'tester',
    title: 'A plug-in tester',
    note: 'Look only at the lamps',
    mark: <TesterLamp state="lit" />,
  },
  {
    have: 'meter',
    title: 'A meter',
    note: 'Only if you have used one before',
    mark: <Drawing path={meter} />,
  },
  {
    have: 'senses',
    title: 'Only eyes and nose',
    note: 'Tingles, trips, dim lights, buzz',
    mark: <Drawing path={eye} />,
  },
]

/** Three ways in, by what one has at hand. Each begins with the questions about danger. */
export function Starts() {
  return (
    <section className="front-starts" aria-labelledby="starts">
      <h2 className="sr-only" id="starts">
        Start with what you have
      </h2>
      <ul>
        {starts.map(({ have, title, note, mark }) => (
          <li key={have}>
            <Link className="front-hang" to={`/check/1?have=${have}`}>
              {mark}
              <span>
                <b>{title}</b>
                <small>{note}</small>
              </span>
              <Icon name="next" className="ml-auto" />
            </Link>
          </li>
        ))}
      </ul>
    </section>
  )
}
