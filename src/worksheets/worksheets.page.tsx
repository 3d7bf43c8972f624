import { Link } from 'react-router-dom'
import { Icon } from '../ui/icon.tsx'
import { Page } from '../ui/page.tsx'
import { Rail } from '../ui/rail.tsx'
import { sheetList } from './sheet-list.ts'
import './worksheets.css'

/** What can be computed. */
export function Component() {
  return (
    <Page title="Worksheets">
      <h1>Worksheets</h1>
      <p className="ws-lead">
        What decides what to do: each with its formula, its source and its cautions. All of them work without
        a network, and their inputs stay in the address and on this device.
      </p>
      <div className="ws-lists">
        {sheetList.map(({ title, sheets }) => (
          <Rail key={title} title={title}>
            <ul className="ws-list">
              {sheets.map(({ to, name, asks }) => (
                <li key={to}>
                  <Link to={`/worksheets/${to}`}>
                    <span>
                      <b>{name}</b>
                      <small>{asks}</small>
                    </span>
                    <Icon name="next" />
                  </Link>
                </li>
              ))}
            </ul>
          </Rail>
        ))}
      </div>
    </Page>
  )
}
