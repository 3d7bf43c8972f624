import type { Caution, Judgment, Result } from '../../rules/worksheets/result.ts'
import { Rail } from '../ui/rail.tsx'
import { SignalPanel } from '../ui/signal-panel.tsx'
import { Tick } from '../ui/tick.tsx'
import { PlotView } from './plot-view.tsx'
import { ResultTable } from './result-table.tsx'
import './result.css'

const tickOf: Readonly<Record<Judgment, 'yes' | 'no' | 'open' | undefined>> = {
  holds: 'yes',
  fails: 'no',
  depends: 'open',
  said: undefined,
}

function Figures({ figures }: Pick<Result, 'figures'>) {
  return (
    <dl className="ws-figures">
      {figures.map(({ label, value, unit, note }) => (
        <div key={label} className={value.length > 16 ? 'ws-wide' : ''}>
          <dt>{label}</dt>
          <dd>
            <b className={/^[\d.,]+$/.test(value) ? '' : 'ws-words'}>{value}</b>
            {unit !== '' && <span> {unit}</span>}
            {note !== undefined && note !== '' && <small>{note}</small>}
          </dd>
        </div>
      ))}
    </dl>
  )
}

/** One panel beside the danger at most; the others stand as lines under it. */
function Cautions({ cautions }: { cautions: readonly Caution[] }) {
  const [first, ...others] = cautions
  if (first === undefined) return null
  return (
    <Rail title="Cautions">
      <SignalPanel word={first.word} slim className="mt-3">
        <p>{first.text}</p>
      </SignalPanel>
      <ul className="ws-lines">
        {others.map(({ word, text }) => (
          <li key={text}>
            {word !== 'notice' && <b>{`${word[0]?.toUpperCase()}${word.slice(1)}. `}</b>}
            {text}
          </li>
        ))}
      </ul>
    </Rail>
  )
}

/** What a worksheet answers: danger, verdict, figures, drawing and tables; then working, sources and assumptions. */
export function ResultView({ result }: { result: Result }) {
  const danger = result.cautions.find(({ word }) => word === 'danger')
  const tick = tickOf[result.judgment]
  return (
    <div className="ws-result">
      <Rail title="What comes out" id="answer">
        {danger && (
          <SignalPanel word="danger" className="mt-3">
            <p>{danger.text}</p>
          </SignalPanel>
        )}
        <p className="ws-verdict" aria-live="polite">
          {tick && <Tick state={tick} />}
          <b>{result.verdict}</b>
        </p>
        {result.because.map((sentence) => (
          <p key={sentence} className="ws-because">
            {sentence}
          </p>
        ))}
        <Figures figures={result.figures} />
        {result.plot && <PlotView plot={result.plot} />}
        {result.tables.map((table) => (
          <ResultTable key={table.title} table={table} />
        ))}
      </Rail>
      <Cautions cautions={result.cautions.filter((caution) => caution !== danger)} />
      <Rail title="How it comes about">
        <dl className="ws-steps">
          {result.steps.map(({ name, formula, filled }) => (
            <div key={name}>
              <dt>{name}</dt>
              <dd>
                <span>{formula}</span>
                <b>{filled}</b>
              </dd>
            </div>
          ))}
        </dl>
      </Rail>
      <div className="ws-foot">
        <Rail title="Taken for granted">
          <ul className="ws-lines">
            {result.assumptions.map((assumption) => (
              <li key={assumption}>{assumption}</li>
            ))}
          </ul>
        </Rail>
        <Rail title="References">
          <ul className="ws-lines">
            {result.references.map(({ cite, fromMemory }) => (
              <li key={cite}>
                {cite}
                {fromMemory && <i> From memory: look it up before it decides anything.</i>}
              </li>
            ))}
          </ul>
        </Rail>
      </div>
    </div>
  )
}
