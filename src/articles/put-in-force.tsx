import { useState } from 'react'
import { Button } from '../ui/button.tsx'
import { Failed } from '../ui/failed.tsx'
import { Field, TextField } from '../ui/field.tsx'
import { Rail } from '../ui/rail.tsx'
import { useToast } from '../ui/toast.tsx'
import { dayInWords } from './day.ts'
import { letGo, putArticleInForce, withdraw } from './drafts.api.ts'
import type { Knowledge } from './knowledge.ts'
import { refusalOf } from './refusal.ts'
import type { Refusal } from './refusal.ts'
import type { DraftDesk } from './use-draft.ts'

type Props = { slug: string; desk: DraftDesk; knowledge: Knowledge; faults: Readonly<Record<string, string>> }

/** One thing at a time is sent; what another one did meanwhile goes to the desk. */
function useSent(desk: DraftDesk) {
  const [sending, setSending] = useState(false)
  const [refusal, setRefusal] = useState<Refusal>()
  const run = async (work: () => Promise<void>) => {
    if (sending) return
    setSending(true)
    setRefusal(undefined)
    try {
      await work()
    } catch (problem) {
      if (!desk.meet(problem)) setRefusal(refusalOf(problem))
    } finally {
      setSending(false)
    }
  }
  return { sending, refusal, run }
}

const refused = (refusal: Refusal | undefined) =>
  refusal !== undefined && <Failed title={refusal.title}>{Object.values(refusal.errors).join(' ')}</Failed>

/** Makes the draft part of a new edition, with a reason. */
export function PutInForce({ slug, desk, faults }: Props) {
  const [reason, setReason] = useState('')
  const { sending, refusal, run } = useSent(desk)
  const say = useToast()
  const { kept, saving } = desk
  const open = kept.pending || saving.state !== 'saved'
  const bars =
    desk.theirs !== undefined
      ? 'Choose between the two texts first.'
      : kept.overtaken
        ? 'Look at what came into force meanwhile first.'
        : Object.keys(faults).length > 0
          ? 'Mend what is marked first.'
          : undefined
  const put = () =>
    run(async () => {
      let edition = 0
      const went = await desk.afterSaving(async ({ version }) => {
        const done = await putArticleInForce(slug, version, reason)
        edition = done.edition
        return done
      })
      if (!went) return
      setReason('')
      say({ text: `Put in force with edition ${edition}.` })
    })
  const letItGo = () =>
    run(async () => {
      const went = await desk.afterSaving(async ({ version }) => {
        const draft = await letGo(slug, version)
        return { draft, text: draft.text ?? undefined }
      })
      if (!went) return
      say({ text: 'The draft is among the revisions; what is in force holds on.' })
    })
  return (
    <Rail title="Put in force" className="mt-7">
      {!open ? (
        <p className="mt-3 text-small">This text is in force. What you change begins a draft.</p>
      ) : (
        <form
          className="mt-3 grid gap-4"
          noValidate
          onSubmit={(event) => {
            event.preventDefault()
            void put()
          }}
        >
          <p className="text-small">
            It comes into force as a new edition, for everyone who may read it. Open pages are offered it.
          </p>
          {refused(refusal)}
          <TextField
            label="Why it is changed"
            value={reason}
            onText={setReason}
            error={refusal?.errors['reason']}
          />
          <div className="w-fit">
            <Button type="submit" look="main" barredBecause={bars}>
              {sending ? 'Putting it in force …' : 'Put in force'}
            </Button>
          </div>
          {kept.pending && kept.inForce !== null && (
            <div>
              <Button size="small" look="plain" onPress={() => void letItGo()}>
                Let this draft go
              </Button>
            </div>
          )}
        </form>
      )}
    </Rail>
  )
}

/** Takes an article out of the search and out of what is suggested; by its link it stays readable, with a mark. */
export function Withdrawal({ slug, desk, knowledge }: Props) {
  const [reason, setReason] = useState('')
  const [instead, setInstead] = useState('')
  const { sending, refusal, run } = useSent(desk)
  const say = useToast()
  const { inForce } = desk.kept
  if (inForce === null) return null
  const since = inForce.withdrawn
  const send = (withdrawn: boolean) =>
    run(async () => {
      const replacedBy = withdrawn && instead !== '' ? { replacedBy: instead } : {}
      let edition = 0
      const went = await desk.afterSaving(async () => {
        const done = await withdraw(slug, { withdrawn, reason, ...replacedBy })
        edition = done.edition
        return done
      })
      if (!went) return
      setReason('')
      say({ text: `${withdrawn ? 'Withdrawn' : 'In force again'} with edition ${edition}.` })
    })
  return (
    <Rail title={since === null ? 'Withdraw' : `Withdrawn on ${dayInWords(since)}`} className="mt-7">
      <form
        className="mt-3 grid gap-4"
        noValidate
        onSubmit={(event) => {
          event.preventDefault()
          void send(since === null)
        }}
      >
        <p className="text-small">
          {since === null
            ? 'A withdrawn article is found and suggested nowhere. Who has its link reads it with a mark.'
            : 'It is found and suggested nowhere. Who has its link reads it with a mark.'}
        </p>
        {refused(refusal)}
        <TextField
          label={since === null ? 'Why it is withdrawn' : 'Why it holds again'}
          value={reason}
          onText={setReason}
          error={refusal?.errors['reason']}
        />
        {since === null && (
          <Field label="To be read instead" error={refusal?.errors['replacedBy']}>
            {(wiring) => (
              <select
                className="input"
                {...wiring}
                value={instead}
                onChange={(event) => setInstead(event.target.value)}
              >
                <option value="">nothing</option>
                {[...knowledge.articles.values()]
                  .filter((one) => one.slug !== slug)
                  .map((one) => (
                    <option key={one.slug} value={one.slug}>
                      {one.title}
                    </option>
                  ))}
              </select>
            )}
          </Field>
        )}
        <div>
          <Button type="submit">
            {sending ? 'Sending …' : since === null ? 'Withdraw this article' : 'Put in force again'}
          </Button>
        </div>
      </form>
    </Rail>
  )
}
