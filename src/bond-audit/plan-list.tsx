import type { Plan } from '../../rules/bond-audit/plan.ts'
import type { System } from '../../rules/bond-audit/system.ts'
import { bondWords, listed } from '../../rules/bond-audit/phrases.ts'
import { Icon } from '../ui/icon.tsx'
import { Rail } from '../ui/rail.tsx'

/** What to change, in order, and what each mode is then. Installing a bond stays held back. */
export function PlanList({ plan, system }: { plan: Plan; system: System }) {
  const nameOf = (id: string) => system.parts.find((part) => part.id === id)?.name ?? id
  const bonds = plan.steps.some((step) => step.bonds)
  return (
    <Rail
      title="Change these, in this order"
      action={
        <span className="text-small text-ink-2">absence of voltage verified (“proved dead”) first</span>
      }
      className="audit-plan"
    >
      <ol>
        {plan.steps.map((step) => (
          <li key={`${step.part} ${step.says}`}>
            <p>
              <b>{nameOf(step.part)}:</b> {step.says}
            </p>
          </li>
        ))}
      </ol>
      {bonds && (
        <div className="plate-dashed audit-held">
          <Icon name="lock" />
          <p>
            <b>Installing a bond is held back.</b> Diagnosis releases it by readings alone: the test bulb at
            the source’s own terminals at 2 V or less both ways, the source up, the bulb proved, instructions
            that allow it, and no reading that speaks against it.
          </p>
        </div>
      )}
      <div className="audit-then">
        <b>Then</b>
        <ul>
          {plan.then.modes.map((mode) => (
            <li key={mode.name}>
              <span className="audit-then-count">{mode.count}</span>
              <span>
                <b>{mode.name}</b>
                <br />
                {mode.passes
                  ? mode.count === 0
                    ? 'no bond wanted'
                    : listed(mode.counted.map(bondWords))
                  : 'still fails'}
              </span>
            </li>
          ))}
          {plan.then.gone.map(({ name }) => (
            <li key={`gone ${name}`}>
              <span className="audit-then-count" aria-hidden="true">
                –
              </span>
              <span>
                <b>{name}</b>
                <br />
                mode taken away
              </span>
            </li>
          ))}
        </ul>
      </div>
      {!plan.passes && (
        <p className="mt-3">These are not all: look at the ways under each mode that still fails.</p>
      )}
    </Rail>
  )
}
