import type { Person } from '../../server/people/people.contract.ts'
import { LinkButton } from '../ui/button.tsx'

/** In place of a form to come in, for whoever is in. */
export function AlreadyIn({ person, to }: { person: Person; to: string }) {
  return (
    <>
      <p className="mt-3">
        You are signed in as {person.name}, {person.email}.
      </p>
      <div className="mt-4 flex flex-wrap gap-3">
        <LinkButton to={to} look="main">
          Go on
        </LinkButton>
        <LinkButton to="/account">Account</LinkButton>
      </div>
    </>
  )
}
