import { useEffect, useRef, useState } from 'react'
import { FieldError } from '../ui/field.tsx'
import { Waiting } from '../ui/waiting.tsx'
import type { MarkdownEditor } from './markdown-editor.tsx'
import { TextArea } from './text-area.tsx'

const label = 'Text, in Markdown'
const help =
  'A quote that begins with > **Danger:**, **Warning:**, **Caution:** or **Notice:** becomes a signal panel.'

type Editor = typeof MarkdownEditor
const bringEditor = () => import('./markdown-editor.tsx')

/** The editor once it is here; `none` where it could not be brought. */
function useEditor(): Editor | 'coming' | 'none' {
  const [editor, setEditor] = useState<{ is: Editor | 'coming' | 'none' }>({ is: 'coming' })
  useEffect(() => {
    let gone = false
    bringEditor().then(
      (part) => !gone && setEditor({ is: part.MarkdownEditor }),
      () => !gone && setEditor({ is: 'none' }),
    )
    return () => {
      gone = true
    }
  }, [])
  return editor.is
}

type BodyFieldProps = {
  value: string
  error: string | undefined
  onText: (text: string) => void
  /** Called with the way to put words in where the cursor is. */
  onReady: (putIn: (words: string) => void) => void
}

/** An article's text. Where the editor can't be brought, a plain field holds the same text. */
export function BodyField({ value, error, onText, onReady }: BodyFieldProps) {
  const Editor = useEditor()
  const plain = useRef<HTMLTextAreaElement>(null)
  useEffect(() => {
    if (Editor !== 'none') return
    onReady((words) => {
      const field = plain.current
      if (field === null) return
      const { selectionStart: from, selectionEnd: to } = field
      const space = /\S$/.test(field.value.slice(0, from)) ? ' ' : ''
      field.focus()
      field.setRangeText(`${space}${words}`, from, to, 'end')
      onText(field.value)
    })
  }, [Editor, onReady, onText])
  if (Editor === 'none')
    return (
      <TextArea label={label} help={help} rows={22} value={value} onText={onText} error={error} ref={plain} />
    )
  return (
    <div>
      {/* Its name for who hears it is within: a label can't reach into a shadow root. */}
      <p className="field-label" aria-hidden="true">
        {label}
      </p>
      {Editor === 'coming' ? (
        <Waiting what="the editor" />
      ) : (
        <Editor
          label={label}
          about={error === undefined ? help : `${error} ${help}`}
          invalid={error !== undefined}
          value={value}
          onText={onText}
          onReady={onReady}
        />
      )}
      <p className="field-help">{help}</p>
      {error !== undefined && <FieldError>{error}</FieldError>}
    </div>
  )
}
