import { useState } from 'react'
import type { Person } from '../../server/people/people.contract.ts'
import { Button, LinkButton } from '../ui/button.tsx'
import { Failed } from '../ui/failed.tsx'
import { Page } from '../ui/page.tsx'
import { Rail } from '../ui/rail.tsx'
import { useToast } from '../ui/toast.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { Form, NewPasswordField, PasswordField } from './form.tsx'
import { changePassword, signOut, useMe } from './people.api.ts'
import { roleWords } from './role-words.ts'
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

function SigningOut({ expired }: { expired: boolean }) {
  const { sending, refusal, run } = useSending()
  const [where, setWhere] = useState<'here' | 'everywhere'>()
  const out = (from: 'here' | 'everywhere') => {
    setWhere(from)
    void run(() => signOut(from))
  }
  return (
    <Rail title="Sign out" className="mt-7">
      <p className="mb-4 mt-2 text-small text-ink-2">
        Your findings sheets stay on this device. What is for qualified people leaves it.
      </p>
      {refusal !== undefined && (
        <div className="mb-4">
          <Failed title={refusal.title} />
        </div>
      )}
      <div className="flex flex-wrap gap-3">
        <Button look="main" onPress={() => out('here')}>
          {sending && where === 'here' ? 'Signing out …' : 'Sign out on this device'}
        </Button>
        {!expired && (
          <Button onPress={() => out('everywhere')}>
            {sending && where === 'everywhere' ? 'Signing out …' : 'Sign out everywhere'}
          </Button>
        )}
      </div>
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
