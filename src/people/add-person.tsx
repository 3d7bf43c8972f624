import { useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import type { LinkMade, NewPerson } from '../../server/people/people.contract.ts'
import { Button } from '../ui/button.tsx'
import { Rail } from '../ui/rail.tsx'
import { EmailField, Form, NameField } from './form.tsx'
import { OneTimeLink } from './one-time-link.tsx'
import { addPerson, peopleQuery } from './people.api.ts'
import { RoleField } from './role-field.tsx'
import { staffRoles } from './role-words.ts'
import { useSending } from './use-sending.ts'

const nobody: NewPerson = { name: '', email: '', role: 'tech' }

/** Makes an account for someone of the shop. */
export function AddPerson() {
  const [person, setPerson] = useState(nobody)
  const [made, setMade] = useState<{ name: string; link: LinkMade }>()
  const { sending, refusal, run } = useSending()
  const client = useQueryClient()
  const add = () =>
    run(async () => {
      setMade(undefined)
      const { link } = await addPerson(person)
      setMade({ name: person.name, link })
      setPerson(nobody)
      await client.invalidateQueries({ queryKey: peopleQuery.queryKey })
    })
  return (
    <Rail title="Add someone of the shop" className="mt-7">
      <p className="mb-4 mt-2 text-small text-ink-2">
        You get a one-time link with which they set their password. Give a tech’s account to qualified people
        alone: it opens live work. Homeowners make their own accounts.
      </p>
      <Form label="Add someone" refusal={refusal} onSubmit={() => void add()}>
        <NameField
          autoComplete="off"
          value={person.name}
          onText={(name) => setPerson({ ...person, name })}
          error={refusal?.errors['name']}
        />
        <EmailField
          autoComplete="off"
          value={person.email}
          onText={(email) => setPerson({ ...person, email })}
          error={refusal?.errors['email']}
        />
        <RoleField
          value={person.role}
          roles={staffRoles.map(([role]) => role)}
          onChoose={(role) => setPerson({ ...person, role })}
          help={staffRoles.find(([role]) => role === person.role)?.[1]}
        />
        <div>
          <Button type="submit" look="main">
            {sending ? 'Adding …' : 'Add and make a link'}
          </Button>
        </div>
      </Form>
      {made !== undefined && <OneTimeLink {...made} onDone={() => setMade(undefined)} />}
    </Rail>
  )
}
