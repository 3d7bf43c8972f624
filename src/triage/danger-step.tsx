import { useNavigate, useSearchParams } from 'react-router-dom'
import { Button } from '../ui/button.tsx'
import { useToast } from '../ui/toast.tsx'
import { Ways } from '../ui/ways.tsx'
import { dangers } from './dangers.ts'
import { openQuestions } from './read-out.ts'
import { StepFrame } from './step-frame.tsx'
import type { DangerId, Triage } from './triage-state.ts'
import { useTriage } from './triage-store.tsx'
import { stoppedBySaying } from './said-stops.ts'

const numbers = ['No', 'One', 'Two', 'Three', 'Four', 'Five', 'Six', 'Seven', 'Eight']
const yesNo = [
  { value: 'yes', label: 'Yes' },
  { value: 'no', label: 'No' },
] as const

const haves = ['tester', 'meter', 'senses'] as const

/** Writes an answer of step 1. Another answer forgets which part it was, and that it was made off. */
export const answerDanger =
  (id: DangerId, answer: 'yes' | 'no') =>
  (from: Triage): Triage => {
    const which = { ...from.which }
    delete which[id]
    return { ...from, dangers: { ...from.dangers, [id]: answer }, which, madeOff: false }
  }

/** Step 1: eight questions before anything is plugged in. One yes stops. */
export function DangerStep() {
  const { triage, change, startAgain } = useTriage()
  const navigate = useNavigate()
  const say = useToast()
  const [search] = useSearchParams()
  const have = haves.find((one) => one === search.get('have'))

  const answer = (id: DangerId) => async (value: 'yes' | 'no') => {
    const write = answerDanger(id, value)
    await change((from) => ({ ...write(from), ...(have === undefined ? {} : { have }) }))
    if (value === 'yes') await navigate('/check/stop')
  }
  const open = openQuestions(triage)
  const stopped = stoppedBySaying(triage)
  const begun = open < dangers.length
  return (
    <StepFrame
      step={1}
      title="Before you touch anything"
      back="/"
      next={
        stopped
          ? { words: 'What to do now', onPress: () => void navigate('/check/stop') }
          : {
              words: 'Next: what feeds it',
              onPress: () => void navigate('/check/2'),
              barredBecause:
                open === 0
                  ? undefined
                  : `${numbers[open]} question${open === 1 ? ' is' : 's are'} still open.`,
            }
      }
    >
      <p className="mt-[6px] text-small text-ink-2">
        Look, smell and listen from where you stand. Plug nothing in yet. One yes is enough: we stop and say
        what to do. <b className="text-ink">Not sure? Answer yes.</b>
      </p>
      <ol className="step-questions">
        {dangers.map(({ id, question }) => (
          <li key={id}>
            <span id={`danger-${id}`}>{question}</span>
            <Ways
              size="glove"
              ways={yesNo}
              value={triage.dangers[id]}
              labelledBy={`danger-${id}`}
              onChoose={(value) => void answer(id)(value)}
            />
          </li>
        ))}
      </ol>
      {begun && (
        <Button
          look="plain"
          className="mt-3"
          onPress={() =>
            void startAgain().then((putBack) =>
              say({ text: 'Answers removed', action: { word: 'Undo', onPress: () => void putBack() } }),
            )
          }
        >
          Start again with no answers
        </Button>
      )}
    </StepFrame>
  )
}
