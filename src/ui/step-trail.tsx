/** "Step 2 of 5" with its trail of nodes. */
export function StepTrail({ step, steps }: { step: number; steps: number }) {
  return (
    <>
      <span className="trail" aria-hidden="true">
        {Array.from({ length: steps }, (_, i) => (
          <i key={i} className={i + 1 < step ? 'trail-done' : i + 1 === step ? 'trail-now' : ''} />
        ))}
      </span>
      <span className="text-small text-ink-3">
        Step {step} of {steps}
      </span>
    </>
  )
}
