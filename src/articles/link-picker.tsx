import { useState } from 'react'
import { search } from '../../rules/search/search.ts'
import { Button } from '../ui/button.tsx'
import { TextField } from '../ui/field.tsx'
import { addressOf } from './hit-row.tsx'
import type { Knowledge } from './knowledge.ts'
import { indexOf } from './use-search.ts'

const kinds = { article: 'Article', cause: 'Cause', test: 'Test' } as const

/** Finds an article, a cause or a test, and hands its link in Markdown on. */
export function LinkPicker({ knowledge, onPick }: { knowledge: Knowledge; onPick: (link: string) => void }) {
  const [query, setQuery] = useState('')
  const hits = query.trim() === '' ? [] : search(indexOf(knowledge), query.trim(), 6).hits
  return (
    <div>
      <TextField
        label="Link to an article, a cause or a test"
        help="The link goes in where the text’s cursor is."
        value={query}
        onText={setQuery}
      />
      {query.trim() !== '' && hits.length === 0 && <p className="mt-2 text-small">Nothing found.</p>}
      {hits.length > 0 && (
        <ul className="rows" aria-label="Links found">
          {hits.map((hit) => {
            const title = hit.title.map((piece) => piece.text).join('')
            return (
              <li key={`${hit.kind} ${hit.id}`} className="flex flex-wrap items-center justify-between gap-3">
                <span className="text-small">
                  {kinds[hit.kind]}: {title}
                  {hit.audience === 'qualified' && ' (qualified people)'}
                </span>
                <Button
                  size="small"
                  label={`Put in a link to ${kinds[hit.kind].toLowerCase()} ${title}`}
                  onPress={() => {
                    onPick(`[${title.replace(/[[\]]/g, '')}](${addressOf(hit.kind, hit.id)})`)
                    setQuery('')
                  }}
                >
                  Put in
                </Button>
              </li>
            )
          })}
        </ul>
      )}
    </div>
  )
}
