import { LinkButton } from '../ui/button.tsx'
import { Page } from '../ui/page.tsx'

/** An address that leads nowhere. */
export function Component() {
  return (
    <Page title="There is no such page" width="text">
      <h1>There is no such page</h1>
      <p className="mt-3">The address may be old, or a letter is missing.</p>
      <div className="mt-5 flex flex-wrap gap-3">
        <LinkButton to="/check" look="main">
          Check my power
        </LinkButton>
        <LinkButton to="/articles">Articles</LinkButton>
      </div>
    </Page>
  )
}
