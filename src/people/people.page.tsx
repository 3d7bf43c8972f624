import { useQuery } from '@tanstack/react-query'
import { NoNetwork } from '../api.ts'
import { LinkButton } from '../ui/button.tsx'
import { Failed } from '../ui/failed.tsx'
import { Page } from '../ui/page.tsx'
import { Rail } from '../ui/rail.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { AddPerson } from './add-person.tsx'
import { peopleQuery, useMe } from './people.api.ts'
import { PersonRow } from './person-row.tsx'
import './people.css'

function People({ own }: { own: string }) {
  const people = useQuery(peopleQuery)
  if (people.isPending) return <Waiting what="the people" />
  if (people.isError)
    return (
      <Failed title="Couldn’t fetch the people." onRetry={() => void people.refetch()}>
        {people.error instanceof NoNetwork
          ? 'No network. The list lies on the server.'
          : people.error.message}
      </Failed>
    )
  return (
    <>
      <Rail title="Everyone with an account" className="mt-6">
        <ul className="people-list">
          {people.data.people.map((person) => (
            <PersonRow key={person.id} person={person} own={person.id === own} />
          ))}
        </ul>
      </Rail>
      <AddPerson />
    </>
  )
}

/** The people of the shop, and homeowners with an account: for admins. */
export function Component() {
  const { known, person } = useMe()
  return (
    <Page title="People" width="text">
      <h1>People</h1>
      {!known ? (
        <Waiting what="the people" />
      ) : person?.role === 'admin' ? (
        <People own={person.id} />
      ) : (
        <>
          <p className="mt-3">This page is for admins of the shop.</p>
          {person === undefined && (
            <div className="mt-4">
              <LinkButton to="/sign-in?next=/shop/people" look="main">
                Sign in
              </LinkButton>
            </div>
          )}
        </>
      )}
    </Page>
  )
}
