/** What to do first, shown at once: it needs no edition, no network and no answer. */
export const stopFirst = {
  title: 'Stop. Keep away from it.',
  now: [
    'Headache, exhaust inside, or a battery that is hot, swollen or hissing? Get everyone out first. Touch no switch. Call from outside.',
    'Keep people and animals away.',
    'If someone can’t let go, don’t touch them. Switch off first.',
    'Dry hands, shoes on, dry floor. Switch off the inverter or generator at its own switch, if you can reach it without touching metal.',
    'Then the breaker, only if you can reach it the same way. On utility: the main breaker.',
    'If you’d have to stand in wet or touch metal, stay away and call.',
    'Turn off auto-start if you know how. Battery and solar wires stay live.',
  ],
} as const

/** The same for what is breathed in and for batteries: leave, touch nothing. */
export const leaveNow = {
  title: 'Get everyone out now.',
  now: [
    'Get people and animals out, into fresh air, well away.',
    'Touch no switch and no plug. Don’t carry a battery anywhere.',
    'Call 911, or your local emergency number, from outside. Say who feels sick.',
    'Stay out until the fire service says you may go back in.',
  ],
} as const

/** What stands under the button once they say it is off. Nothing here implies that all is well. */
export const offIsNotProved = {
  off: 'Off is not proved. Stay away from the metal until a professional has tested it.',
  out: 'Out is not over. Stay out until the fire service says you may go back in.',
} as const
