import type { Triage } from './triage-state.ts'

export type Notice = {
  /** The finding's id in the edition. */
  finding: string
  question: string
  help?: string
  /** `said` is how it is told on the phone. */
  ways: readonly { value: string; label: string; said: string }[]
  /** Asked only when it makes sense. */
  when?: (notices: Triage['notices']) => boolean
}

/** Not a value of the edition: it leads back to the dangers of step 1. */
export const someVeryBright = 'some-very-bright'

const tripped = (finding: string) => (notices: Triage['notices']) =>
  notices[finding]?.startsWith('trips') === true

/** What can be seen and heard with nothing opened. Every one may be left out. */
export const notices: readonly Notice[] = [
  {
    finding: 'extent',
    question: 'How much is affected?',
    ways: [
      { value: 'one-receptacle', label: 'This outlet only', said: 'Only this outlet is affected.' },
      {
        value: 'one-circuit',
        label: 'A few outlets or one room',
        said: 'A few outlets or one room are affected.',
      },
      { value: 'everything', label: 'Everything', said: 'Everything is affected.' },
    ],
  },
  {
    finding: 'onset',
    question: 'When did it begin?',
    ways: [
      { value: 'always', label: 'It was always so', said: 'It was always so.' },
      { value: 'after-new-work', label: 'After new work', said: 'It began after new work.' },
      { value: 'after-storm', label: 'After a storm', said: 'It began after a storm.' },
      {
        value: 'after-source-change',
        label: 'After the inverter, generator or battery was changed',
        said: 'It began after the inverter, generator or battery was changed.',
      },
      { value: 'only-on-battery', label: 'Only on battery', said: 'It happens only on battery.' },
      {
        value: 'only-on-backup-or-grid',
        label: 'Only on generator or utility',
        said: 'It happens only on generator or utility.',
      },
    ],
  },
  {
    finding: 'lights',
    question: 'What do the lights do?',
    ways: [
      { value: 'steady', label: 'Steady', said: 'The lights are steady.' },
      {
        value: 'dim-under-load',
        label: 'Dim when something starts',
        said: 'The lights dim when something starts.',
      },
      { value: 'flicker', label: 'Flicker', said: 'The lights flicker.' },
      { value: 'out', label: 'Out', said: 'The lights are out.' },
      { value: someVeryBright, label: 'Some are very bright', said: 'Some lights are very bright.' },
    ],
  },
  {
    finding: 'breaker.in-use',
    question: 'Does a breaker trip?',
    help: 'A breaker that switched itself off stands in the middle or at off.',
    ways: [
      { value: 'trips-at-once', label: 'Trips at once', said: 'A breaker trips at once.' },
      { value: 'trips-after-minutes', label: 'Trips after minutes', said: 'A breaker trips after minutes.' },
      { value: 'holds', label: 'Stays on', said: 'No breaker trips.' },
    ],
  },
  {
    finding: 'breaker.reset',
    question: 'If you switched it on again: what then?',
    help: 'Once is enough. If it tripped again, leave it off.',
    ways: [
      { value: 'stays', label: 'Stays on', said: 'Switched on again, it stays on.' },
      { value: 'trips-again', label: 'Trips again', said: 'Switched on again, it trips again.' },
      { value: 'feels-loose', label: 'Feels loose or mushy', said: 'The breaker feels loose.' },
    ],
    when: tripped('breaker.in-use'),
  },
  {
    finding: 'gfci.in-use',
    question: 'Does a GFCI trip?',
    help: 'A GFCI is the outlet with a Test and a Reset button.',
    ways: [
      { value: 'trips-at-once', label: 'Trips at once', said: 'A GFCI trips at once.' },
      {
        value: 'trips-with-load',
        label: 'Trips with something running',
        said: 'A GFCI trips when something runs.',
      },
      { value: 'holds', label: 'Stays on', said: 'No GFCI trips.' },
    ],
  },
  {
    finding: 'gfci.reset',
    question: 'If you pressed Reset: what then?',
    ways: [
      { value: 'resets', label: 'It resets', said: 'The GFCI resets.' },
      { value: 'will-not-reset', label: 'It will not reset', said: 'The GFCI will not reset.' },
    ],
    when: tripped('gfci.in-use'),
  },
  {
    finding: 'receptacle.face',
    question: 'What does the face of the outlet look like?',
    ways: [
      {
        value: 'grounded',
        label: 'Two slots, one longer, and a ground hole',
        said: 'The outlet has two slots and a ground hole.',
      },
      { value: 'two-slot', label: 'Two slots only', said: 'The outlet has two slots only.' },
      {
        value: 'unpolarized',
        label: 'Another kind, with a ground pin or clips',
        said: 'The outlet is of another kind, with a ground pin or clips.',
      },
    ],
  },
  {
    finding: 'source.restarts',
    question: 'Does the inverter or generator start by itself?',
    ways: [
      { value: 'yes', label: 'Yes', said: 'The source starts by itself.' },
      { value: 'no', label: 'No', said: 'The source doesn’t start by itself.' },
    ],
  },
]

/** The questions to ask, given what was answered so far. */
export const noticesToAsk = (answered: Triage['notices']): readonly Notice[] =>
  notices.filter((notice) => notice.when?.(answered) ?? true)
