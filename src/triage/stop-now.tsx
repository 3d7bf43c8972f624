import { useEdition } from '../editions/edition.api.ts'
import { CallButton, LinkButton } from '../ui/button.tsx'
import { Page } from '../ui/page.tsx'
import { Rail } from '../ui/rail.tsx'
import { shop } from '../ui/shop.ts'
import { SignalPanel } from '../ui/signal-panel.tsx'
import { OptionList } from '../ui/ways.tsx'
import { dangers } from './dangers.ts'
import { GuideLine } from './guide-line.tsx'
import { StopView } from './stop-view.tsx'
import { StopWords } from './stop-words.tsx'
import type { DangerId } from './triage-state.ts'
import { useTriage } from './triage-store.tsx'
import { WhichWasIt } from './which-was-it.tsx'
import { onlyWarm, rank, saidStops } from './said-stops.ts'

/** Every danger that can be named, in a sentence of its own, the worst first. */
const choices = dangers
  .flatMap((danger) => danger.parts.map((part) => ({ danger: danger.id, part })))
  .sort((a, b) => rank(a.part.stop) - rank(b.part.stop))
  .map(({ danger, part }) => ({ value: `${danger}/${part.id}`, label: part.said }))

/** Come straight from the danger bar: first what holds for all, then which it is. */
function StraightHere() {
  const { change } = useTriage()
  const { edition } = useEdition()
  const choose = (value: string) => {
    const [id, part] = value.split('/') as [DangerId, string]
    void change((from) => ({
      ...from,
      dangers: { ...from.dangers, [id]: 'yes' },
      which: { ...from.which, [id]: part },
      madeOff: false,
    })).then(() => window.scrollTo(0, 0))
  }
  return (
    <Page title="What to do now" width="text" className="stop-page">
      <StopWords stops={[]} edition={edition} />
      <CallButton number={shop.phone} size="glove" wide>
        Call {shop.name}, {shop.phone}
      </CallButton>
      <Rail title="What is it?">
        <p className="mb-2 mt-1 text-small text-ink-2">Choose one, and we say what to do in that case.</p>
        <OptionList label="What is it?" ways={choices} value={undefined} onChoose={choose} />
      </Rail>
      <LinkButton to="/check/1" wide>
        None of these: ask me the questions
      </LinkButton>
      <GuideLine />
    </Page>
  )
}

/** A little warm and nothing else: no stop yet, but that circuit stays off. */
function Warm() {
  return (
    <Page title="A little warm" width="text" className="stop-page">
      <SignalPanel word="caution" live>
        <h1 className="text-[1.625rem] leading-[1.22]">Switch that circuit off, and leave it off</h1>
        <p className="mt-2">
          Unplug what runs there, if the plug is cool. Switch its breaker off. Leave it off until a
          professional has looked at it. If it gets hot, smells or buzzes: stop, keep away and call.
        </p>
      </SignalPanel>
      <CallButton number={shop.phone} size="glove" wide>
        Call {shop.name}, {shop.phone}
      </CallButton>
      <WhichWasIt />
      <LinkButton to="/check/1" look="main" size="glove" wide iconAfter="next">
        Go on with the questions
      </LinkButton>
      <GuideLine />
    </Page>
  )
}

/** What to do now. */
export function StopNow() {
  const { triage } = useTriage()
  const { edition } = useEdition()
  const stops = saidStops(triage)
  if (stops.length > 0) return <StopView stops={stops} edition={edition} />
  return onlyWarm(triage) ? <Warm /> : <StraightHere />
}
