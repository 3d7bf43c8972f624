import { typicalContext } from '../../rules/loop/known-context.ts'
import { readLoopDirective } from '../../rules/loop/loop-directive.ts'
import { LateLoop } from '../ui/loop/late-loop.tsx'

/** A loop picture in an article, from the data of its block; or one sentence that says why there is none. */
export function ArticleLoop({ block }: { block: string }) {
  const said = readLoopDirective(block)
  if (!said.ok) return <p className="text-small">{said.says}</p>
  return (
    <div className="article-loop">
      <LateLoop context={typicalContext(said.cause)} cause={said.cause} begin={said.state} />
    </div>
  )
}
