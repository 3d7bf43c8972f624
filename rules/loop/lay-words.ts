/** What is written at each place: its name, what was read there, its breaker and bonds, and whether its metal is live. */
import { inAmps, inVolts } from './amounts.ts'
import { breakerDoes } from './breaker.ts'
import type { Frame } from './frame.ts'
import { tieAlong, tieNames } from './lay-parts.ts'
import { metalIsLive } from './loop-state.ts'
import type { LoopState, Metal, Place } from './loop-state.ts'
import type { LoopScene } from './scene.ts'
import { isBrief } from './way.ts'

type Text = LoopScene['texts'][number]
type Label = LoopScene['labels'][number]
/** What was read at each place, one reading a line: "H–N 119.6 V". */
export type ReadAt = Partial<Record<Place, readonly string[]>>

/** Width of a bold letter at 14 px, px: Noto Sans, on the wide side. */
const letter = 8.2
const labelHeight = 23

const titles = (state: LoopState): Readonly<Record<Place, string>> => ({
  source: state.sourceLabel,
  panel: 'Panel',
  receptacle: state.places.includes('panel') ? 'Receptacle' : 'Its receptacle',
})
/** What an inverter gives into a fault is its own limit, not what the wires would let through. */
function breakerWords(state: LoopState): [string, string] {
  const { breaker, limited, drawn } = state
  const upTo = limited && drawn === 'fault' && breakerDoes(breaker) !== 'stays' ? 'up to ' : ''
  return [
    `breaker ${breaker.amps} A`,
    breaker.sees < 1e-5 ? 'sees nothing' : `sees ${upTo}${inAmps(breaker.sees)}`,
  ]
}
const breakerIsAt = (state: LoopState, place: Place): boolean =>
  place === (state.places.includes('panel') ? 'panel' : 'source')

function metalWords(metal: Metal, brief: boolean, short: boolean): string {
  const volts = inVolts(metal.volts)
  if (brief) return short ? `${volts} at first` : `${volts} until cut off`
  if (short) return `LIVE ${volts}`
  return metal.is === 'joined' ? `LIVE: ${volts} to neutral` : `LIVE: ${volts} to earth`
}

function labelAt(x: number, y: number, text: string, brief: boolean): Label {
  return {
    x,
    y,
    width: Math.round(text.length * letter) + 12,
    height: labelHeight,
    text,
    look: brief ? 'brief' : 'live',
  }
}
const liveMetal = (state: LoopState, place: Place): Metal | undefined =>
  state.metal.find((metal) => metal.place === place && metalIsLive(metal))

/** Lying: the name above the metal, the rest inside it. */
function lyingWords(
  frame: Frame,
  state: LoopState,
  place: Place,
  read: readonly string[],
): { texts: Text[]; labels: Label[] } {
  const [from, to] = frame.boxOf(place)
  const { rows, at, edge } = frame
  const last = place === 'receptacle'
  const beside = { x: last ? to : from, anchor: last ? 'end' : 'start' } as const
  const name = last ? `${titles(state)[place]}, and what is plugged in` : titles(state)[place]
  const texts: Text[] = [
    { at: [beside.x, read.length > 0 ? 20 : 38], text: name, look: 'title', anchor: beside.anchor },
  ]
  if (read.length > 0)
    texts.push({
      at: [beside.x, 41],
      text: `read: ${read.join(' · ')}`,
      look: 'quiet',
      anchor: beside.anchor,
    })
  if (breakerIsAt(state, place)) {
    const middle = (frame.breaker[0] + frame.breaker[1]) / 2
    const [rating, sees] = breakerWords(state)
    texts.push({ at: [middle, rows.hot + 20], text: rating, look: 'quiet', anchor: 'middle' })
    texts.push({ at: [middle, rows.hot + 37], text: sees, look: 'name', anchor: 'middle' })
  }
  for (const tie of state.ties.filter((one) => one.place === place))
    texts.push({
      at:
        tie.kind === 'middle'
          ? at(frame.tie - 14, rows.hot - 18)
          : at(tieAlong(frame, place) + 10, rows.ground - 22),
      text: tieNames[tie.kind],
      look: 'quiet',
      anchor: 'start',
    })
  const metal = liveMetal(state, place)
  if (metal === undefined) return { texts, labels: [] }
  const brief = isBrief(state, metal)
  return {
    texts,
    labels: [labelAt(from + 10, edge[1] - labelHeight - 7, metalWords(metal, brief, false), brief)],
  }
}

/** Standing: one line below the other in the column beside the metal. */
function standingWords(
  frame: Frame,
  state: LoopState,
  place: Place,
  read: readonly string[],
): { texts: Text[]; labels: Label[] } {
  const x = frame.edge[1] + 12
  let y = frame.boxOf(place)[0] + 15
  const texts: Text[] = []
  const labels: Label[] = []
  const say = (text: string, look: Text['look'] = 'quiet') => {
    texts.push({ at: [x, y], text, look, anchor: 'start' })
    y += 17
  }
  say(titles(state)[place], 'title')
  if (place === 'receptacle') for (const line of ['and what is', 'plugged in']) say(line)
  const metal = liveMetal(state, place)
  if (metal !== undefined) {
    const brief = isBrief(state, metal)
    labels.push(labelAt(x - 2, y - 11, metalWords(metal, brief, true), brief))
    y += labelHeight + 6
  }
  for (const line of read) say(line)
  for (const tie of state.ties.filter((one) => one.place === place)) say(tieNames[tie.kind])
  if (breakerIsAt(state, place)) {
    y = Math.max(y, frame.breaker[0] + 10)
    const [rating, sees] = breakerWords(state)
    say(rating)
    say(sees, 'name')
  }
  return { texts, labels }
}

export function placeWords(frame: Frame, state: LoopState, read: ReadAt): { texts: Text[]; labels: Label[] } {
  const words = frame.lie === 'lying' ? lyingWords : standingWords
  const all = state.places.map((place) => words(frame, state, place, read[place] ?? []))
  return { texts: all.flatMap(({ texts }) => texts), labels: all.flatMap(({ labels }) => labels) }
}
