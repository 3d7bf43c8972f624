import type { ReactNode } from 'react'
import { Waiting } from '../ui/waiting.tsx'
import { useWriter } from './edit-link.tsx'
import { SignInHere } from './for-qualified.tsx'

/** What is for who writes articles; others are told so. */
export function WritersOnly({ title, children }: { title: string; children: ReactNode }) {
  const writer = useWriter()
  if (writer === true) return children
  return (
    <>
      <h1>{title}</h1>
      {writer === undefined ? (
        <Waiting what="who is signed in" />
      ) : (
        <>
          <p className="mb-4 mt-3">Articles are written by senior techs of the shop.</p>
          <SignInHere />
        </>
      )}
    </>
  )
}
