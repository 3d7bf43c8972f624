import { useQuery } from '@tanstack/react-query'
import { useEffect, useState } from 'react'
import { useNavigate, useParams } from 'react-router-dom'
import { isQualified } from '../../server/people/roles.contract.ts'
import { ApiProblem } from '../api.ts'
import { useEdition } from '../editions/edition.api.ts'
import { loadSheet } from '../offline/sheets.ts'
import { listSendings } from '../offline/unsent.ts'
import { useMe } from '../people/people.api.ts'
import { openShared } from '../sheets/sheets.api.ts'
import { LinkButton } from '../ui/button.tsx'
import { Failed } from '../ui/failed.tsx'
import { Page } from '../ui/page.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { bringSheet } from './bring-sheet.ts'

const title = 'A homeowner’s findings'

/** Opens the sheet of a link on this device; then it is one of its sheets. */
function Opening({ token }: { token: string }) {
  const navigate = useNavigate()
  const [failed, setFailed] = useState<string>()
  const shared = useQuery({
    queryKey: ['shared', token] as const,
    queryFn: async ({ signal }) => {
      const known = (await listSendings()).find((sending) => sending.link === token)
      const here = known && (await loadSheet(known.sheet))
      return here === undefined
        ? { opened: await openShared(token, signal) }
        : { here: here.id, opened: undefined }
    },
    staleTime: 0,
    gcTime: 0,
  })
  const { edition } = useEdition(shared.data?.opened?.edition)
  const { data } = shared
  useEffect(() => {
    if (data === undefined) return
    let wanted = true
    const open = async () => {
      if (data.opened === undefined) return data.here
      return edition && bringSheet(edition, data.opened, token)
    }
    open().then(
      (id) => wanted && id !== undefined && void navigate(`/diagnosis?sheet=${id}`, { replace: true }),
      () => wanted && setFailed('This device keeps nothing for this page.'),
    )
    return () => {
      wanted = false
    }
  }, [data, edition, navigate, token])
  const gone = shared.error instanceof ApiProblem && shared.error.status === 404
  if (gone)
    return (
      <p className="mt-3">
        There is no such link any more. Whoever gave it has taken it back, or made another. Ask them.
      </p>
    )
  if (shared.isError || failed !== undefined)
    return (
      <Failed title="Couldn’t open the sheet." onRetry={() => void shared.refetch()}>
        {failed ?? shared.error?.message}
      </Failed>
    )
  return <Waiting what="the sheet" />
}

/** Where a homeowner's link leads: for techs alone. */
export function Component() {
  const { token = '' } = useParams()
  const { known, person } = useMe()
  return (
    <Page title={title} width="text">
      <h1>{title}</h1>
      {!known ? (
        <Waiting what="the sheet" />
      ) : isQualified(person?.role) ? (
        <Opening token={token} />
      ) : (
        <>
          <p className="mt-3">
            This link is for the professional it was made for. It opens in Diagnosis, for a tech who is signed
            in.
          </p>
          {person === undefined ? (
            <LinkButton
              to={`/sign-in?next=${encodeURIComponent(`/sheets/${token}`)}`}
              look="main"
              className="mt-4"
            >
              Sign in
            </LinkButton>
          ) : (
            <p className="mt-3">You are signed in as {person.name}, with a homeowner’s account.</p>
          )}
        </>
      )}
    </Page>
  )
}
