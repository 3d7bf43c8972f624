import { useDeferredValue, useEffect, useMemo, useRef, useState } from 'react'
import { useSearchParams } from 'react-router-dom'
import { buildIndex, search } from '../../rules/search/search.ts'
import type { Found, SearchIndex } from '../../rules/search/search.ts'
import type { Knowledge } from './knowledge.ts'

let last: { key: string; index: SearchIndex } | undefined

/** The index of what this person may read, built once for an edition. */
export function indexOf(knowledge: Knowledge): SearchIndex {
  const { edition, info, articles, procedures, qualified } = knowledge
  const key = [info.hash, qualified, articles.size, procedures.length].join()
  if (last?.key === key) return last.index
  const { causes, tests } = edition.file
  last = { key, index: buildIndex([...articles.values()], causes, tests, procedures) }
  return last.index
}

/** What a query finds, kept out of the way of typing. */
export function useFound(knowledge: Knowledge, query: string): Found {
  const late = useDeferredValue(query)
  const index = indexOf(knowledge)
  return useMemo(() => search(index, late), [index, late])
}

const quietMs = 300

/** The query as typed, and in the address once the typing pauses, so that Back and a shared link bring it again. */
export function useQuery(): [string, (text: string) => void] {
  const [params, setParams] = useSearchParams()
  const inAddress = params.get('q') ?? ''
  const [text, setText] = useState(inAddress)
  const written = useRef(inAddress)
  useEffect(() => {
    if (inAddress === written.current) return
    written.current = inAddress
    setText(inAddress)
  }, [inAddress])
  useEffect(() => {
    if (text === written.current) return
    const timer = setTimeout(() => {
      written.current = text
      setParams(text === '' ? {} : { q: text }, { replace: true, preventScrollReset: true })
    }, quietMs)
    return () => clearTimeout(timer)
  }, [text, setParams])
  return [text, setText]
}
