import { useId, useMemo, useState } from 'react'
import { drawnAs } from '../../../rules/loop/drawn-as.ts'
import { layOutLoop } from '../../../rules/loop/lay-out.ts'
import type { ReadAt } from '../../../rules/loop/lay-words.ts'
import { loopOf } from '../../../rules/loop/loop-of.ts'
import type { LoopOptions, LoopStateName } from '../../../rules/loop/loop-options.ts'
import type { LoopState } from '../../../rules/loop/loop-state.ts'
import { loopDefaults } from '../../../rules/loop/loop-wiring.ts'
import { loopWords } from '../../../rules/loop/loop-words.ts'
import type { WiringContext } from '../../../rules/circuit/wiring/context.ts'
import { LoopDrawing } from './loop-drawing.tsx'
import { LoopToggles } from './loop-toggles.tsx'
import { LoopWordsList } from './loop-words-list.tsx'
import './loop.css'

type PictureProps = { state: LoopState; read: ReadAt; spoken: string; still: boolean }

/** Lying where there is room for it, standing elsewhere: the style shows one of the two. */
function Pictures({ state, read, spoken, still }: PictureProps) {
  const id = useId()
  const scenes = useMemo(
    () => (['lying', 'standing'] as const).map((lie) => ({ lie, scene: layOutLoop(state, lie, read) })),
    [state, read],
  )
  const look = `loop ${still ? 'loop-still' : ''} ${state.nominal === 230 ? 'loop-230' : ''}`
  return scenes.map(({ lie, scene }) => (
    <svg
      key={lie}
      className={`${look} loop-${lie}`}
      viewBox={`0 0 ${scene.width} ${scene.height}`}
      role="img"
      aria-label={spoken}
    >
      <LoopDrawing scene={scene} hatch={`${id}-${lie}`} />
    </svg>
  ))
}

const nothingRead: ReadAt = {}

type LoopPictureProps = {
  context: WiringContext
  /** A cause of the catalogue. */
  cause: string
  /** What is drawn first. */
  begin?: LoopStateName
  /** What was read at each place. */
  read?: ReadAt
}

/**
 * The loop of a cause: from the source and back to it, or not. With a load running or a hot wire on metal; bond, rod
 * and second bond can be turned on and off, and the words follow.
 */
export function LoopPicture({ context, cause, begin = 'fault', read = nothingRead }: LoopPictureProps) {
  const as = useMemo(() => drawnAs(cause), [cause])
  const { source, system, wiring } = context
  const own = useMemo(() => loopDefaults({ source, system, wiring }, cause), [source, system, wiring, cause])
  const [turned, setTurned] = useState<Partial<LoopOptions>>({})
  const [still, setStill] = useState(false)
  const options = useMemo(() => own && { state: begin, ...own, ...turned }, [own, begin, turned])
  const state = useMemo(
    () => options && loopOf({ source, system, wiring }, cause, options),
    [source, system, wiring, cause, options],
  )
  const words = useMemo(() => state && loopWords(state), [state])
  if (as === undefined) return <p className="text-small">No loop picture: this cause is not known here.</p>
  if ('because' in as) return <p className="text-small">No loop picture of this cause. {as.because}</p>
  if (own === undefined || options === undefined || state === undefined || words === undefined)
    return (
      <p className="text-small">
        No loop picture: this cause can’t occur with this source, system and wiring.
      </p>
    )
  return (
    <figure className="loop-figure">
      <LoopToggles
        options={options}
        own={own}
        panel={state.places.includes('panel')}
        onTurn={(part) => setTurned({ ...turned, ...part })}
        onAsFound={() => setTurned(turned.state === undefined ? {} : { state: turned.state })}
        still={still}
        onStill={setStill}
      />
      <p className="loop-verdict" aria-live="polite">
        {words.title}.
      </p>
      <div className="loop-both">
        <div className="loop-pictures">
          <Pictures state={state} read={read} spoken={words.spoken} still={still} />
        </div>
        <LoopWordsList words={words} />
      </div>
      <figcaption>
        Filled arrows: current. Hollow: under 4 mA. Dashed: open or missing. Hatched metal: live. Computed for
        typical wires and a {state.breaker.amps} A breaker; yours differ. Local code and the authority having
        jurisdiction decide.
      </figcaption>
    </figure>
  )
}
