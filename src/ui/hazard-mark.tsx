export type HazardClass = 'closed' | 'closed-can-energize' | 'open-dead' | 'open-live'

const wave = 'M6 13q2.5-5 5 0t5 0'
const shut = 'M3 4h16v14H3zM3 8h16'
const open = 'M3 8v10h16V8M3 8L17 1'
const marks: Record<HazardClass, { path: string; words: string }> = {
  closed: { path: shut, words: 'Nothing opened' },
  'closed-can-energize': {
    path: shut + wave,
    words: 'Nothing opened, can make metal live: qualified only',
  },
  'open-dead': { path: `${open}M8 13h6`, words: 'Cover off, proved dead: qualified only' },
  'open-live': { path: open + wave, words: 'Cover off, live: qualified only' },
}

/** How much of the enclosure is open and whether something may be live: a box, always with its words. */
export function HazardMark({ hazard, words }: { hazard: HazardClass; words?: string }) {
  return (
    <span className="hazard">
      <svg viewBox="0 0 22 20" aria-hidden="true" focusable="false">
        <path d={marks[hazard].path} />
      </svg>
      <span>{words ?? marks[hazard].words}</span>
    </span>
  )
}
