import { useCallback, useRef } from 'react'
import { Field, TextField } from '../ui/field.tsx'
import { BodyField } from './body-field.tsx'
import { ChooseSome } from './choose-some.tsx'
import type { Knowledge } from './knowledge.ts'
import { LinkPicker } from './link-picker.tsx'
import { TextArea } from './text-area.tsx'
import type { DraftDesk } from './use-draft.ts'

type DraftFieldsProps = {
  desk: DraftDesk
  knowledge: Knowledge
  /** Field → what keeps it from being put in force. */
  faults: Readonly<Record<string, string>>
}

/** Everything an article consists of, to be typed. */
export function DraftFields({ desk, knowledge, faults }: DraftFieldsProps) {
  const { form, change } = desk
  const putIn = useRef<(words: string) => void>(undefined)
  const onReady = useCallback((put: (words: string) => void) => {
    putIn.current = put
  }, [])
  const onText = useCallback((body: string) => change({ body }), [change])
  const { causes, tests } = knowledge.edition.file
  return (
    <div className="draft-fields">
      <TextField
        label="Title"
        value={form.title}
        onText={(title) => change({ title })}
        error={faults['title']}
      />
      <Field
        label="Written for"
        help={
          form.audience === 'everyone'
            ? 'Homeowners read it: nothing opened, nothing that can make metal live.'
            : 'Work with covers off or power on. Only techs who are signed in get it.'
        }
      >
        {(wiring) => (
          <select
            className="input"
            {...wiring}
            value={form.audience}
            onChange={(event) =>
              change({ audience: event.target.value === 'everyone' ? 'everyone' : 'qualified' })
            }
          >
            <option value="everyone">everyone</option>
            <option value="qualified">qualified people</option>
          </select>
        )}
      </Field>
      <BodyField value={form.body} error={faults['body']} onText={onText} onReady={onReady} />
      <LinkPicker knowledge={knowledge} onPick={(link) => putIn.current?.(link)} />
      <ChooseSome
        label="Causes it is about"
        one="cause"
        all={causes}
        chosen={form.causes}
        onChoose={(ids) => change({ causes: ids })}
        error={faults['causes']}
      />
      <ChooseSome
        label="Tests it uses"
        one="test"
        all={tests}
        chosen={form.tests}
        onChoose={(ids) => change({ tests: ids })}
        error={faults['tests']}
      />
      <TextArea
        label="Words people search for"
        help="A line each, symptoms first."
        rows={6}
        value={form.words}
        onText={(words) => change({ words })}
        error={faults['words']}
      />
      <TextArea
        label="Sources"
        help="A line each: where its facts come from."
        rows={4}
        value={form.sources}
        onText={(sources) => change({ sources })}
        error={faults['sources']}
      />
      <div className="draft-days">
        <DayField
          label="Reviewed"
          value={form.reviewed}
          onText={(reviewed) => change({ reviewed })}
          error={faults['reviewed']}
        />
        <DayField
          label="Next review"
          help="Empty: none planned."
          value={form.dueForReview}
          onText={(dueForReview) => change({ dueForReview })}
          error={faults['dueForReview']}
        />
      </div>
    </div>
  )
}

type DayFieldProps = {
  label: string
  help?: string
  value: string
  onText: (day: string) => void
  error: string | undefined
}

function DayField({ label, help, error, value, onText }: DayFieldProps) {
  return <TextField label={label} help={help} type="date" value={value} onText={onText} error={error} />
}
