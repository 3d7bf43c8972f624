import { useEffect, useState } from 'react'
import { isRouteErrorResponse, useRouteError } from 'react-router-dom'
import { serverAnswers } from '../api.ts'
import { LinkButton, Button } from '../ui/button.tsx'
import { Page } from '../ui/page.tsx'

/** A part of the page lies on the server and could not be fetched; each browser has its own words for that. */
const isMissingPart = (problem: unknown): boolean =>
  problem instanceof Error &&
  /dynamically imported module|importing a module script|preload/i.test(problem.message)

/** Loading again helps where somebody brings the page: the server, or the worker that keeps the pages. */
const canLoad = async (): Promise<boolean> =>
  (await serverAnswers()) || ('serviceWorker' in navigator && navigator.serviceWorker.controller !== null)

/** A part of the program is missing: never brought, or gone from the server since this tab was opened. */
function MissingPart() {
  const title = 'This page isn’t on this device yet'
  const [answers, setAnswers] = useState(false)
  const [stillNot, setStillNot] = useState(false)
  useEffect(() => {
    let wanted = true
    void serverAnswers().then((does) => wanted && setAnswers(does))
    return () => {
      wanted = false
    }
  }, [])
  const again = async () => {
    if (await canLoad()) window.location.reload()
    else setStillNot(true)
  }
  return (
    <Page title={title} width="text">
      <h1>{title}</h1>
      <p className="mt-3">
        {answers
          ? 'A newer version of these pages has come. Load it: what you typed is still here.'
          : 'It must be opened once with a network. What you typed is still here.'}
      </p>
      <div className="mt-5 flex flex-wrap gap-3">
        <Button onPress={() => void again()}>{answers ? 'Load it' : 'Try again'}</Button>
        <LinkButton to="/" look="plain">
          To the front page
        </LinkButton>
      </div>
      <p className="mt-3" role="status">
        {stillNot && 'Still no network.'}
      </p>
    </Page>
  )
}

/** What a page shows in place of itself when it can't be drawn. */
export function PageError() {
  const problem = useRouteError()
  if (isMissingPart(problem)) return <MissingPart />
  const nowhere = isRouteErrorResponse(problem) && problem.status === 404
  const title = nowhere ? 'There is no such page' : 'This page can’t be shown'
  return (
    <Page title={title} width="text">
      <h1>{title}</h1>
      <p className="mt-3">
        {nowhere
          ? 'The address may be old, or a letter is missing.'
          : 'Something in it failed. What you typed is still here. Load the page again; if it fails again, call the shop.'}
      </p>
      <div className="mt-5 flex flex-wrap gap-3">
        <Button onPress={() => window.location.reload()}>Try again</Button>
        <LinkButton to="/" look="plain">
          To the front page
        </LinkButton>
      </div>
    </Page>
  )
}
