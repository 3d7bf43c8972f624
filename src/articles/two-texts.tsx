import { useMe } from '../people/people.api.ts'
import { Button } from '../ui/button.tsx'
import { Difference } from './difference.tsx'
import { textOf, wholeOf } from './draft-form.ts'
import type { DraftDesk } from './use-draft.ts'

/** Somebody else saved meanwhile: both texts, and the writer chooses. */
export function TwoTexts({ desk }: { desk: DraftDesk }) {
  const { theirs, form } = desk
  const { person } = useMe()
  if (theirs === undefined) return null
  const other = theirs.text
  const by = theirs.edited?.by ?? 'Somebody'
  const said =
    by === person?.name
      ? 'Another text of yours came in while you were writing.'
      : `${by} changed this article while you were writing.`
  return (
    <section className="plate-dashed my-5" role="alert" aria-label="Two texts">
      <p className="font-bold">{said}</p>
      <p className="mt-2 text-small">
        Nothing is lost: yours is in the fields below, theirs stands here. You can carry words over before you
        choose; the text you don’t go on with stays among the revisions.
      </p>
      {other !== null && (
        <>
          <h2 className="mt-4 text-body">From theirs to yours</h2>
          <Difference
            former={wholeOf(other)}
            now={wholeOf(textOf(form))}
            label="Difference from theirs to yours"
          />
          <details className="more mt-3 text-small">
            <summary>Their whole text</summary>
            <pre className="difference" tabIndex={0} aria-label="Their whole text">
              {wholeOf(other)}
            </pre>
          </details>
        </>
      )}
      <div className="mt-4 flex flex-wrap gap-3">
        <Button look="main" onPress={() => void desk.choose('mine')}>
          Go on with mine
        </Button>
        <Button onPress={() => void desk.choose('theirs')}>Go on with theirs</Button>
      </div>
    </section>
  )
}

/** Another text came into force after this draft was begun. */
export function Overtaken({ desk }: { desk: DraftDesk }) {
  const { kept, form, theirs } = desk
  if (!kept.overtaken || kept.inForce === null || theirs !== undefined) return null
  const { hash, text } = kept.inForce
  const mine = textOf(form)
  return (
    <section className="plate-dashed my-5" aria-label="In force meanwhile">
      <p className="font-bold">Another text of this article came into force since this draft was begun.</p>
      <p className="mt-2 text-small">Look at what differs and carry over what must stay, then say so.</p>
      <h2 className="mt-4 text-body">From what is in force to this draft</h2>
      <Difference former={wholeOf(text)} now={wholeOf(mine)} label="Difference from what is in force" />
      <div className="mt-4">
        <Button onPress={() => void desk.replaceWith(mine, { onto: hash })}>
          The draft takes it into account
        </Button>
      </div>
    </section>
  )
}
