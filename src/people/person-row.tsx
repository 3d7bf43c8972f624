import { useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import type { LinkMade, PersonRow as Row } from '../../server/people/people.contract.ts'
import { Button } from '../ui/button.tsx'
import { Failed } from '../ui/failed.tsx'
import { useToast } from '../ui/toast.tsx'
import { OneTimeLink } from './one-time-link.tsx'
import { changePerson, makeLink, peopleQuery } from './people.api.ts'
import { RoleField } from './role-field.tsx'
import { roleWords } from './role-words.ts'
import { useSending } from './use-sending.ts'

const roles = ['helper', 'tech', 'senior', 'admin'] as const

const stateOf = ({ leftAt, hasPassword }: Row) =>
  leftAt !== null ? 'account closed' : hasPassword ? undefined : 'has not set a password yet'

function Changes({ person }: { person: Row }) {
  const [role, setRole] = useState(person.role)
  const [link, setLink] = useState<LinkMade>()
  const { refusal, run } = useSending()
  const client = useQueryClient()
  const say = useToast()
  const change = async (what: Parameters<typeof changePerson>[1], words: string) => {
    const done = await run(async () => {
      await changePerson(person.id, what)
      await client.invalidateQueries({ queryKey: peopleQuery.queryKey })
    })
    if (done) say({ text: words })
  }
  return (
    <>
      {refusal !== undefined && (
        <div className="mt-3">
          <Failed title={refusal.title} />
        </div>
      )}
      {person.leftAt === null ? (
        <>
          <div className="people-more">
            <RoleField value={role} roles={roles} onChoose={setRole} />
            <Button
              onPress={() =>
                void change({ role }, `${person.name} is ${roleWords[role]} now, and signed out everywhere.`)
              }
              {...(role === person.role ? { barredBecause: 'Choose another role first.' } : {})}
            >
              Change the role
            </Button>
          </div>
          <div className="people-more">
            <Button size="small" onPress={() => void run(async () => setLink(await makeLink(person.id)))}>
              Make a one-time link
            </Button>
            <Button
              size="small"
              onPress={() => void change({ left: true }, `${person.name}’s account is closed.`)}
            >
              Close the account
            </Button>
          </div>
        </>
      ) : (
        <div className="people-more">
          <Button
            size="small"
            onPress={() => void change({ left: false }, `${person.name} can sign in again.`)}
          >
            Open the account again
          </Button>
        </div>
      )}
      {link !== undefined && <OneTimeLink name={person.name} link={link} onDone={() => setLink(undefined)} />}
    </>
  )
}

/** One person, and what an admin may change about them. Nobody changes their own. */
export function PersonRow({ person, own }: { person: Row; own: boolean }) {
  const [open, setOpen] = useState(false)
  const state = stateOf(person)
  return (
    <li>
      <div className="people-row">
        <div>
          <b>{person.name}</b>
          <div className="text-small text-ink-2">{person.email}</div>
        </div>
        <span>
          {roleWords[person.role]}
          {state !== undefined && <span className="text-small text-ink-2">, {state}</span>}
        </span>
        {own ? (
          <span className="text-small text-ink-2">you</span>
        ) : (
          <Button size="small" expanded={open} label={`Change ${person.name}`} onPress={() => setOpen(!open)}>
            Change
          </Button>
        )}
      </div>
      {open && <Changes key={person.role} person={person} />}
    </li>
  )
}
