import { useState } from 'react'
import { useNavigate } from 'react-router-dom'
import { Slug } from '../../server/articles/drafts.contract.ts'
import { Button } from '../ui/button.tsx'
import { Failed } from '../ui/failed.tsx'
import { TextField } from '../ui/field.tsx'
import { Page } from '../ui/page.tsx'
import { saveDraft, theirsOf } from './drafts.api.ts'
import { refusalOf } from './refusal.ts'
import { WritersOnly } from './writers-only.tsx'

const slugOf = (title: string) =>
  title
    .normalize('NFKD')
    .toLowerCase()
    .replace(/[’']/g, '')
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '')
    .slice(0, 60)
    .replace(/-+$/, '')

const outline = `What somebody sees, hears or measures when this is so.

## What to do
> **Caution:** Say here what can hurt, before anything is done.

1. The first thing to do.
`

function Begin() {
  const [title, setTitle] = useState('')
  const [typedSlug, setSlug] = useState<string>()
  const [refusal, setRefusal] = useState<{ title?: string; slug?: string }>({})
  const [sending, setSending] = useState(false)
  const navigate = useNavigate()
  const slug = typedSlug ?? slugOf(title)
  const begin = async () => {
    if (sending) return
    if (!Slug.safeParse(slug).success)
      return setRefusal({ slug: 'Use lower case letters, digits and hyphens; not “new”.' })
    setSending(true)
    setRefusal({})
    try {
      await saveDraft(slug, {
        version: '0-new',
        head: {
          title,
          audience: 'qualified',
          causes: [],
          tests: [],
          words: [],
          sources: [],
          reviewed: '',
          dueForReview: '',
        },
        body: outline,
      })
      await navigate(`/articles/${slug}/edit`, { replace: true })
    } catch (problem) {
      setSending(false)
      setRefusal(
        theirsOf(problem) === undefined
          ? { title: refusalOf(problem).title }
          : { slug: 'There is an article at this address. Choose another.' },
      )
    }
  }
  return (
    <>
      <h1>New article</h1>
      <form
        className="mt-4 grid max-w-[480px] gap-4"
        aria-label="Begin an article"
        noValidate
        onSubmit={(event) => {
          event.preventDefault()
          void begin()
        }}
      >
        {refusal.title !== undefined && <Failed title={refusal.title} />}
        <TextField label="Title" help="What one sees, in few words." value={title} onText={setTitle} />
        <TextField
          label="Address"
          help={`It will stand at /articles/${slug === '' ? '…' : slug}, for good.`}
          value={slug}
          onText={setSlug}
          error={refusal.slug}
        />
        <div>
          <Button type="submit" look="main">
            {sending ? 'Beginning …' : 'Begin'}
          </Button>
        </div>
      </form>
    </>
  )
}

/** Where a new article begins. */
export function NewArticle() {
  return (
    <Page title="New article" width="text">
      <WritersOnly title="New article">
        <Begin />
      </WritersOnly>
    </Page>
  )
}
