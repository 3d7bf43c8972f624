/** The editor of Markdown. It weighs more than all other pages together: only `body-field.tsx` fetches it. */
import { markdown, markdownLanguage } from '@codemirror/lang-markdown'
import { HighlightStyle, syntaxHighlighting } from '@codemirror/language'
import { tags } from '@lezer/highlight'
import CodeMirror, { Compartment, EditorState, EditorView } from '@uiw/react-codemirror'
import { useCallback, useMemo, useState } from 'react'
import { createPortal } from 'react-dom'
import { tooMuchMarkdown } from '../../rules/edition/markdown-limits.ts'

export type MarkdownEditorProps = {
  label: string
  /** Help and fault, for who hears the page. */
  about: string
  invalid: boolean
  value: string
  onText: (text: string) => void
  /** Called with the way to put words in where the cursor is. */
  onReady: (putIn: (words: string) => void) => void
}

const look = EditorView.theme({
  '&': { color: 'var(--ink)', background: 'transparent' },
  '&.cm-focused': { outline: 'none' },
  '.cm-scroller': { fontFamily: 'var(--face)', fontSize: 'var(--t-body)', lineHeight: '1.5' },
  '.cm-content': { padding: '10px 0', caretColor: 'var(--ink)', minHeight: '420px' },
  '.cm-line': { padding: '0 14px' },
})
const inks = HighlightStyle.define([
  { tag: tags.heading, fontWeight: '800' },
  { tag: tags.strong, fontWeight: '700' },
  { tag: tags.emphasis, fontStyle: 'italic' },
  { tag: tags.strikethrough, textDecoration: 'line-through' },
  { tag: tags.link, color: 'var(--glow)' },
  { tag: [tags.url, tags.processingInstruction, tags.monospace], color: 'var(--ink-2)' },
])
// What is too much for the preview is too much for the editor's own reading of it too: then it is plain text. Decided
// with the change itself, because the change is read before anything else can look at it.
const reading = new Compartment()
const asMarkdown = [markdown({ base: markdownLanguage, completeHTMLTags: false }), syntaxHighlighting(inks)]
const asPlain = [syntaxHighlighting(inks)]
const choose = (text: string) => (tooMuchMarkdown(text) === undefined ? asMarkdown : asPlain)
const readOrNot = EditorState.transactionExtender.of((change) => {
  if (!change.docChanged) return null
  const wanted = choose(change.newDoc.toString())
  return reading.get(change.startState) === wanted ? null : { effects: reading.reconfigure(wanted) }
})
const writing = [readOrNot, look, EditorView.lineWrapping]
// What is left out has words or colors that are not ours, or takes the page's own keys.
const setup = {
  lineNumbers: false,
  foldGutter: false,
  highlightActiveLine: false,
  highlightSelectionMatches: false,
  drawSelection: false,
  dropCursor: false,
  rectangularSelection: false,
  crosshairCursor: false,
  bracketMatching: false,
  closeBrackets: false,
  autocompletion: false,
  syntaxHighlighting: false,
  searchKeymap: false,
  foldKeymap: false,
  completionKeymap: false,
  lintKeymap: false,
} as const

/**
 * Several lines of Markdown. It lives in an open shadow root: there its styles are sheets made by script, which the
 * page's policy lets through, where style elements would be refused. Tab leaves it, as it leaves every field.
 */
export function MarkdownEditor({ label, about, invalid, value, onText, onReady }: MarkdownEditorProps) {
  const [root, setRoot] = useState<ShadowRoot>()
  const host = useCallback((node: HTMLDivElement | null) => {
    if (node !== null) setRoot(node.shadowRoot ?? node.attachShadow({ mode: 'open', delegatesFocus: true }))
  }, [])
  const read = choose(value)
  const extensions = useMemo(
    () => [
      writing,
      reading.of(read),
      EditorView.contentAttributes.of({
        'aria-label': label,
        'aria-describedby': 'about',
        spellcheck: 'true',
        autocorrect: 'on',
        autocapitalize: 'sentences',
        ...(invalid && { 'aria-invalid': 'true' }),
      }),
    ],
    [label, invalid, read],
  )
  return (
    <div className={`input markdown-editor ${invalid ? 'markdown-editor-invalid' : ''}`} ref={host}>
      {root &&
        createPortal(
          <>
            <CodeMirror
              root={root}
              value={value}
              onChange={onText}
              extensions={extensions}
              basicSetup={setup}
              indentWithTab={false}
              theme="none"
              onCreateEditor={(view) =>
                onReady((words) => {
                  const { from } = view.state.selection.main
                  const space = /^\S$/.test(view.state.sliceDoc(Math.max(0, from - 1), from)) ? ' ' : ''
                  view.dispatch(view.state.replaceSelection(`${space}${words}`), { scrollIntoView: true })
                  view.focus()
                })
              }
            />
            <p id="about" hidden>
              {about}
            </p>
          </>,
          root,
        )}
    </div>
  )
}
