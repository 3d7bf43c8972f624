import type { ReactNode } from 'react'
import { useLocation } from 'react-router-dom'
import { LinkButton } from '../ui/button.tsx'
import { Icon } from '../ui/icon.tsx'

/** To the sign-in page, and back to where one was. */
export function SignInHere() {
  const { pathname, search } = useLocation()
  return (
    <LinkButton to={`/sign-in?next=${encodeURIComponent(pathname + search)}`} size="small">
      Sign in
    </LinkButton>
  )
}

/** What is named here but not opened on this device, and what opens it. */
export function ForQualified({ children }: { children: ReactNode }) {
  return (
    <div className="plate-dashed mt-5">
      <p className="flex items-start gap-3 font-bold">
        <Icon name="lock" />
        <span>For qualified people</span>
      </p>
      <p className="mt-2 text-small">{children}</p>
      <p className="screen-only mt-3 text-small">
        It opens for techs of the shop who are signed in. Not one of them: leave it to a professional.
      </p>
      <div className="screen-only mt-3">
        <SignInHere />
      </div>
    </div>
  )
}
