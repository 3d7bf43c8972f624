import { Link, useParams } from 'react-router-dom'
import { worksheetNames } from '../../rules/worksheets/worksheets.ts'
import type { WorksheetName } from '../../rules/worksheets/worksheets.ts'
import { useQualified } from '../people/people.api.ts'
import { Button, LinkButton } from '../ui/button.tsx'
import { Dock } from '../ui/dock.tsx'
import { Page } from '../ui/page.tsx'
import { shop } from '../ui/shop.ts'
import { useToast } from '../ui/toast.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { Ways } from '../ui/ways.tsx'
import { FormView } from './form-view.tsx'
import { forms } from './forms/forms.ts'
import type { Form } from './forms/parts.ts'
import { InputsInPrint } from './inputs-in-print.tsx'
import { ResultView } from './result-view.tsx'
import { ToMend } from './to-mend.tsx'
import { useWorksheet } from './use-worksheet.ts'
import type { Worksheet } from './use-worksheet.ts'
import './worksheets.css'
import './paper.css'

const unitWays = [
  { value: 'american', label: 'Feet, AWG' },
  { value: 'metric', label: 'Meters, mm²' },
] as const

function Tools({ form, sheet }: { form: Form; sheet: Worksheet }) {
  const say = useToast()
  return (
    <div className="ws-tools screen-only">
      {form.hasUnits && (
        <Ways
          label="Units"
          ways={unitWays}
          value={sheet.units}
          onChoose={sheet.switchUnits}
          className="ws-units"
        />
      )}
      <Button icon="print" onPress={() => window.print()}>
        Print
      </Button>
      {sheet.from !== 'example' && (
        <Button
          look="plain"
          icon="undo"
          onPress={() => {
            const back = sheet.beginAnew()
            say({ text: 'The example is back', action: { word: 'Undo', onPress: back } })
          }}
        >
          Begin anew
        </Button>
      )}
    </div>
  )
}

function Sheet({ name, form }: { name: WorksheetName; form: Form }) {
  const sheet = useWorksheet(name, form)
  const qualified = useQualified()
  if (sheet === undefined)
    return (
      <Page title={form.title} className="ws-page">
        <h1>{form.title}</h1>
        <Waiting what="the worksheet" />
      </Page>
    )
  const { answer } = sheet
  return (
    <>
      <Page title={form.title} className="ws-page">
        <header className="ws-head">
          <div>
            <p className="ws-kind">
              <Link className="link-alone screen-only" to="/worksheets">
                Worksheets
              </Link>
              <span className="ws-paper">{shop.name} · Worksheet</span>
            </p>
            <h1>{form.title}</h1>
            <p className="ws-lead">{form.lead}</p>
          </div>
          <Tools form={form} sheet={sheet} />
        </header>
        {qualified === false && (
          <p className="ws-note">
            For people who work on wiring. It computes from what is typed; it sends nobody to open anything.
          </p>
        )}
        {sheet.from === 'example' && (
          <p className="ws-note">
            <b>An example stands here.</b> Put in your own figures: what they give is for your system alone.
          </p>
        )}
        <div className="ws">
          <FormView form={form} sheet={sheet} />
          <InputsInPrint form={form} sheet={sheet} />
          {'result' in answer ? (
            <ResultView result={answer.result} />
          ) : (
            <ToMend form={form} sheet={sheet} errors={answer.errors} />
          )}
        </div>
      </Page>
      <PhoneVerdict sheet={sheet} />
    </>
  )
}

/** On a phone the answer lies far below the form: its first words stay in sight. */
function PhoneVerdict({ sheet: { answer } }: { sheet: Worksheet }) {
  return (
    <div className="ws-dock">
      <Dock label="In short">
        <a className="ws-dock-link" href="#answer">
          <span>{'result' in answer ? answer.result.verdict : 'No answer yet: entries to mend.'}</span>
          <b>See</b>
        </a>
      </Dock>
    </div>
  )
}

/** One worksheet: inputs, and what comes out, as they are typed. */
export function Component() {
  const { name } = useParams()
  const known = worksheetNames.find((one) => one === name)
  if (known === undefined)
    return (
      <Page title="There is no such worksheet" width="text">
        <h1>There is no such worksheet</h1>
        <p className="mt-3">The address may be old, or a letter is missing.</p>
        <div className="mt-5">
          <LinkButton to="/worksheets" look="main">
            All worksheets
          </LinkButton>
        </div>
      </Page>
    )
  return <Sheet key={known} name={known} form={forms[known]} />
}
