import { useState } from 'react'
import type { Person } from '../../server/people/me.contract.ts'
import { Button, LinkButton } from '../ui/button.tsx'
import { Page } from '../ui/page.tsx'
import { Rail } from '../ui/rail.tsx'
import { useToast } from '../ui/toast.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { Form, NewPasswordField, PasswordField } from './form.tsx'
import { useMe } from './people.api.ts'
import { changePassword } from './requests.ts'
import { roleWords } from './role-words.ts'
import { SigningOut } from './signing-out.tsx'
import { Unclaimed } from './unclaimed.tsx'
import { useSending } from './use-sending.ts'

function Password() {
  const [current, setCurrent] = useState('')
  const [password, setPassword] = useState('')
  const { sending, refusal, run } = useSending()
  const say = useToast()
  const change = async () => {
    if (!(await run(() => changePassword(current, password)))) return
    setCurrent('')
    setPassword('')
    say({ text: 'Password changed. Other devices are signed out.' })
  }
  return (
    <Rail title="Password" className="mt-7">
      <p className="mb-4 mt-2 text-small text-ink-2">With a new password all other devices are signed out.</p>
      <Form label="Change the password" refusal={refusal} onSubmit={() => void change()}>
        <PasswordField
          label="Current password"
          value={current}
          onText={setCurrent}
          error={refusal?.errors['current']}
        />
        <NewPasswordField
          label="New password"
          value={password}
          onText={setPassword}
          error={refusal?.errors['password']}
        />
        <div>
          <Button type="submit">{sending ? 'Changing it …' : 'Change the password'}</Button>
        </div>
      </Form>
    </Rail>
  )
}

function Account({ person, expired }: { person: Person; expired: boolean }) {
  return (
    <>
      <p className="mt-3">
        <b>{person.name}</b>, {person.email}
      </p>
      <p className="mt-1">Signed in as {roleWords[person.role]}.</p>
      {expired ? (
        <div className="mt-5">
          <p className="mb-3">
            Your session has ended with time. What you typed is still on this device; sign in again so that it
            can be sent.
          </p>
          <LinkButton to="/sign-in?next=/account" look="main">
            Sign in again
          </LinkButton>
        </div>
      ) : (
        <Password />
      )}
      <Unclaimed who={person.id} />
      <SigningOut expired={expired} />
    </>
  )
}

/** One's own account. */
export function Component() {
  const { known, person, expired } = useMe()
  return (
    <Page title="Account" width="text">
      <h1>Account</h1>
      {!known ? (
        <Waiting what="your account" />
      ) : person === undefined ? (
        <>
          <p className="mt-3">Nobody is signed in on this device.</p>
          <div className="mt-4">
            <LinkButton to="/sign-in?next=/account" look="main">
              Sign in
            </LinkButton>
          </div>
        </>
      ) : (
        <Account person={person} expired={expired} />
      )}
    </Page>
  )
}
