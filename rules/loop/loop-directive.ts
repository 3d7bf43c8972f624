/**
 * A loop picture in an article: a fenced block named `loop` whose lines say which cause, and in which state.
 *
 *     ```loop
 *     cause: floating-neutral
 *     state: fault
 *     ```
 */
import { drawnAs } from './drawn-as.ts'
import { loopStates } from './loop-options.ts'
import type { LoopStateName } from './loop-options.ts'

export type LoopDirective = { ok: true; cause: string; state: LoopStateName } | { ok: false; says: string }

const refuse = (says: string): LoopDirective => ({ ok: false, says: `No loop picture: ${says}.` })
const isState = (text: string): text is LoopStateName => (loopStates as readonly string[]).includes(text)

/**
 * Reads the lines of a loop block as data; nothing of it reaches the page as markup.
 * @returns what to draw, or one plain sentence that says why nothing is drawn
 */
export function readLoopDirective(text: string): LoopDirective {
  const said = new Map<string, string>()
  for (const line of text.split('\n').map((one) => one.trim())) {
    if (line === '') continue
    const [, key = '', value = ''] = /^([a-z]+):\s*([a-z0-9-]*)$/.exec(line) ?? []
    if (key !== 'cause' && key !== 'state')
      return refuse('its block may hold the lines “cause:” and “state:” alone')
    said.set(key, value)
  }
  const cause = said.get('cause') ?? ''
  const state = said.get('state') ?? 'fault'
  if (drawnAs(cause) === undefined)
    return refuse(cause === '' ? 'its block names no cause' : `there is no cause “${cause}”`)
  if (!isState(state)) return refuse(`its state is “load” or “fault”, not “${state}”`)
  return { ok: true, cause, state }
}
