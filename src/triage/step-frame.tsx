import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { Button } from '../ui/button.tsx'
import { Dock } from '../ui/dock.tsx'
import { Failed } from '../ui/failed.tsx'
import { Icon } from '../ui/icon.tsx'
import { Page } from '../ui/page.tsx'
import { StepTrail } from '../ui/step-trail.tsx'
import { useTriage } from './triage-store.tsx'

type StepFrameProps = {
  step: 1 | 2 | 3 | 4 | 5
  title: string
  /** Where Back leads. */
  back: string
  next: { words: string; onPress: () => void; barredBecause?: string | undefined }
  /** Leaves this step out. Not on step 1. */
  onSkip?: () => void
  /** Something in place of the dock: the number pad. */
  instead?: ReactNode
  children: ReactNode
}

/** One step of the check: the trail above, the question, and what comes next below. */
export function StepFrame({ step, title, back, next, onSkip, instead, children }: StepFrameProps) {
  const { keepsNothing } = useTriage()
  return (
    <>
      <nav aria-label="Steps" className="step-nav">
        <Link to={back} className="word-btn">
          <Icon name="back" />
          Back
        </Link>
        <StepTrail step={step} steps={5} />
      </nav>
      <Page title={`Step ${step}: ${title}`} width="text" className="step-page">
        <h1>{title}</h1>
        {keepsNothing && (
          <div className="mt-3">
            <Failed title="This device can’t keep your answers.">
              They are here until you leave or reload this page.
            </Failed>
          </div>
        )}
        {children}
      </Page>
      {instead ?? (
        <Dock>
          <Button
            look="main"
            size="glove"
            wide
            iconAfter="next"
            onPress={next.onPress}
            {...(next.barredBecause === undefined ? {} : { barredBecause: next.barredBecause })}
          >
            {next.words}
          </Button>
          {onSkip && (
            <Button look="plain" wide onPress={onSkip}>
              Not sure? Skip
            </Button>
          )}
        </Dock>
      )}
    </>
  )
}
