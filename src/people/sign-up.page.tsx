import { useState } from 'react'
import { Link, useSearchParams } from 'react-router-dom'
import { Button } from '../ui/button.tsx'
import { Page } from '../ui/page.tsx'
import { AlreadyIn } from './already-in.tsx'
import { EmailField, Form, NameField, NewPasswordField } from './form.tsx'
import { nextAddress } from './next-address.ts'
import { signUp, useMe } from './people.api.ts'
import { useSending } from './use-sending.ts'

/** A homeowner makes an account. */
export function Component() {
  const [params] = useSearchParams()
  const next = params.get('next')
  const to = nextAddress(next, window.location.origin)
  const { person, expired } = useMe()
  const [name, setName] = useState('')
  const [email, setEmail] = useState('')
  const [password, setPassword] = useState('')
  const { sending, refusal, run } = useSending()
  return (
    <Page title="Make an account" width="text">
      <h1>Make an account</h1>
      {person !== undefined && !expired ? (
        <AlreadyIn person={person} to={to} />
      ) : (
        <>
          <p className="mt-3">
            For homeowners, and whoever helps them. You do not need one to check your power.
          </p>
          <div className="mt-5">
            <Form
              label="Make an account"
              refusal={refusal}
              onSubmit={() => void run(() => signUp({ name, email, password }, to))}
            >
              <NameField value={name} onText={setName} error={refusal?.errors['name']} />
              <EmailField value={email} onText={setEmail} error={refusal?.errors['email']} />
              <NewPasswordField value={password} onText={setPassword} error={refusal?.errors['password']} />
              <div>
                <Button type="submit" look="main" size="glove">
                  {sending ? 'Making it …' : 'Make my account'}
                </Button>
              </div>
            </Form>
          </div>
          <p className="mt-6">
            You have one?{' '}
            <Link to={`/sign-in${next === null ? '' : `?next=${encodeURIComponent(to)}`}`}>Sign in</Link>
          </p>
        </>
      )}
    </Page>
  )
}
