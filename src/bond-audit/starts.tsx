import { arrangements } from '../../rules/bond-audit/arrangements.ts'
import type { System } from '../../rules/bond-audit/system.ts'

/** Common arrangements, one a button: a start to change until it is the system at hand. */
export function Starts({ onStart }: { onStart: (system: System) => void }) {
  return (
    <ul className="audit-starts">
      {arrangements.map(({ id, title, what, system }) => (
        <li key={id}>
          <button type="button" className="opt" onClick={() => onStart(system)}>
            <span>
              {title}
              <small>{what}</small>
            </span>
          </button>
        </li>
      ))}
    </ul>
  )
}
