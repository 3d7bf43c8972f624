import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { useLocation } from 'react-router-dom'
import { ApiProblem, NoNetwork } from '../api.ts'
import { Button, LinkButton } from '../ui/button.tsx'
import { Failed } from '../ui/failed.tsx'
import { Page } from '../ui/page.tsx'
import { shop } from '../ui/shop.ts'
import { Waiting } from '../ui/waiting.tsx'
import { Form, NewPasswordField } from './form.tsx'
import { linkQuery, setPassword } from './people.api.ts'
import { useSending } from './use-sending.ts'

function Opened({ token }: { token: string }) {
  const link = useQuery(linkQuery(token))
  const [password, setText] = useState('')
  const { sending, refusal, run } = useSending()
  if (link.isPending) return <Waiting what="the link" />
  if (link.isError && link.error instanceof ApiProblem && link.error.status === 404)
    return (
      <>
        <p className="mt-3">
          This link does not hold any more: it was used, another took its place, or its three days are over.
          Ask {shop.name} for a new one: phone {shop.phone}.
        </p>
        <div className="mt-4">
          <LinkButton to="/sign-in">Sign in</LinkButton>
        </div>
      </>
    )
  if (link.isError)
    return (
      <Failed title="Couldn’t look at the link." onRetry={() => void link.refetch()}>
        {link.error instanceof NoNetwork ? 'No network.' : link.error.message}
      </Failed>
    )
  return (
    <>
      <p className="mt-3">
        For {link.data.name}, {link.data.email}. Whoever is signed in with this account elsewhere will be
        signed out.
      </p>
      <div className="mt-5">
        <Form
          label="Set your password"
          refusal={refusal}
          onSubmit={() => void run(() => setPassword(token, password, '/'))}
        >
          <input type="hidden" autoComplete="username" value={link.data.email} readOnly />
          <NewPasswordField value={password} onText={setText} error={refusal?.errors['password']} />
          <div>
            <Button type="submit" look="main" size="glove">
              {sending ? 'Setting it …' : 'Set it and sign in'}
            </Button>
          </div>
        </Form>
      </div>
    </>
  )
}

/** A one-time link leads here. What lets in stands behind the #, which no browser sends and no log holds. */
export function Component() {
  const token = useLocation().hash.slice(1)
  return (
    <Page title="Set your password" width="text">
      <h1>Set your password</h1>
      {token === '' ? (
        <p className="mt-3">This page opens with a one-time link from {shop.name}.</p>
      ) : (
        <Opened key={token} token={token} />
      )}
    </Page>
  )
}
