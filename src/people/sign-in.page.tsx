import { useState } from 'react'
import { Link, useSearchParams } from 'react-router-dom'
import { Button } from '../ui/button.tsx'
import { Page } from '../ui/page.tsx'
import { shop } from '../ui/shop.ts'
import { AlreadyIn } from './already-in.tsx'
import { EmailField, Form, PasswordField } from './form.tsx'
import { nextAddress } from './next-address.ts'
import { signIn, useMe } from './people.api.ts'
import { useSending } from './use-sending.ts'

/** Signing in, and back to where one was sent from. */
export function Component() {
  const [params] = useSearchParams()
  const next = params.get('next')
  const to = nextAddress(next, window.location.origin)
  const { person, expired } = useMe()
  const [email, setEmail] = useState('')
  const [password, setPassword] = useState('')
  const { sending, refusal, run } = useSending()
  const more = next === null ? '' : `?next=${encodeURIComponent(to)}`
  return (
    <Page title="Sign in" width="text">
      <h1>Sign in</h1>
      {person !== undefined && !expired ? (
        <AlreadyIn person={person} to={to} />
      ) : (
        <>
          {person !== undefined && (
            <p className="mt-3">
              Your session has ended with time, {person.name}. What you typed is still on this device.
            </p>
          )}
          <div className="mt-5">
            <Form
              label="Sign in"
              refusal={refusal}
              onSubmit={() => void run(() => signIn(email, password, to))}
            >
              <EmailField value={email} onText={setEmail} error={refusal?.errors['email']} />
              <PasswordField value={password} onText={setPassword} error={refusal?.errors['password']} />
              <div>
                <Button type="submit" look="main" size="glove">
                  {sending ? 'Signing in …' : 'Sign in'}
                </Button>
              </div>
            </Form>
          </div>
          <p className="mt-6">
            Homeowner, and no account yet? <Link to={`/sign-up${more}`}>Make one</Link>
          </p>
          <p className="mt-3 text-small text-ink-2">
            Password forgotten, or a tech without an account? Ask {shop.name} for a one-time link: phone{' '}
            {shop.phone}. “Check my power” needs no account.
          </p>
        </>
      )}
    </Page>
  )
}
