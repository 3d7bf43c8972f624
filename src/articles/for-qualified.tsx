import type { ReactNode } from 'react'
import { LinkButton } from '../ui/button.tsx'
import { Icon } from '../ui/icon.tsx'

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
        It opens on a device whose user has stated to be qualified. Not qualified: leave it to a professional.
      </p>
      <div className="screen-only mt-3">
        <LinkButton to="/diagnosis" size="small">
          State that you are qualified
        </LinkButton>
      </div>
    </div>
  )
}
