import { isRouteErrorResponse, useRouteError } from 'react-router-dom'
import { LinkButton, Button } from '../ui/button.tsx'
import { Page } from '../ui/page.tsx'

/** A part of the page lies on the server and could not be fetched; each browser has its own words for that. */
const isMissingPart = (problem: unknown): boolean =>
  problem instanceof Error &&
  /dynamically imported module|importing a module script|preload/i.test(problem.message)

function wordsFor(problem: unknown): { title: string; words: string } {
  if (isRouteErrorResponse(problem) && problem.status === 404)
    return { title: 'There is no such page', words: 'The address may be old, or a letter is missing.' }
  if (isMissingPart(problem) || !navigator.onLine)
    return {
      title: 'This page isn’t on this device yet',
      words: 'It must be opened once with a network. What you typed is still here.',
    }
  return {
    title: 'This page can’t be shown',
    words:
      'Something in it failed. What you typed is still here. Load the page again; if it fails again, call the shop.',
  }
}

/** What a page shows in place of itself when it can't be drawn. */
export function PageError() {
  const { title, words } = wordsFor(useRouteError())
  return (
    <Page title={title} width="text">
      <h1>{title}</h1>
      <p className="mt-3">{words}</p>
      <div className="mt-5 flex flex-wrap gap-3">
        <Button onPress={() => window.location.reload()}>Try again</Button>
        <LinkButton to="/" look="plain">
          To the front page
        </LinkButton>
      </div>
    </Page>
  )
}
