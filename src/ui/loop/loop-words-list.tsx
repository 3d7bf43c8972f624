import type { LoopWords } from '../../../rules/loop/loop-words.ts'

/** What the picture says, danger first. */
export function LoopWordsList({ words }: { words: LoopWords }) {
  return (
    <div className="loop-words">
      {words.danger.map((line) => (
        <p key={line} className="loop-danger">
          <b>Danger:</b> {line}
        </p>
      ))}
      <ul>
        {words.says.map((line) => (
          <li key={line}>{line}</li>
        ))}
      </ul>
    </div>
  )
}
