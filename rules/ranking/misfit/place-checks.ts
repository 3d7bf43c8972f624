import type { Check } from './contradiction.ts'

/** Volts that grow or appear along the run: what lies behind can't have more than what feeds it. */
export const alongTheRun: Check = ({ amount, nominal, legs, wiring, fact }) => {
  const at = (place: string) => {
    const volts = amount(`${place}.hn.volts`)
    return volts === undefined ? undefined : volts / nominal
  }
  const [source, panel, receptacle] = [at('source'), at('panel'), at('receptacle')]
  const live = (x: number | undefined) => x !== undefined && x > 0.5
  const dead = (x: number | undefined) => x !== undefined && x < 0.1
  if (live(receptacle) && dead(source) && (dead(panel) || wiring === 'direct'))
    return {
      because: 'The receptacle is live with the source and the panel dead.',
      again: 'receptacle.hn.volts',
    }
  if (live(receptacle) && live(source) && dead(panel))
    return {
      because: 'The panel reads dead between a live source and a live receptacle.',
      again: 'panel.hn.volts',
    }
  // With two legs a lost neutral lifts one of them, and two hots make twice the volts: only one leg is that plain.
  const spans = [
    ['source', 'panel', source, panel],
    ['panel', 'receptacle', panel, receptacle],
    ['source', 'receptacle', source, receptacle],
  ] as const
  const legsApart = ['apart', 'one-dead'].includes(fact('legs.pattern') ?? '')
  for (const [before, place, ahead, here] of spans) {
    if (ahead === undefined || here === undefined || ahead < 0.1) continue
    if (here - ahead > (legs === 1 ? 0.08 : legsApart ? 2 : 1.1))
      return {
        because: `The ${place} reads more than the ${before} that feeds it.`,
        again: `${place}.hn.volts`,
      }
  }
  return undefined
}

const elsewhere = ['on-hot', 'half', 'uneven', 'just-short', 'short', 'needle']

/** Ground on neutral at the source and at the receptacle, and not at the panel between them. */
export const betweenTwoAlike: Check = ({ fact }) =>
  fact('source.pattern') === 'on-neutral' &&
  fact('receptacle.pattern') === 'on-neutral' &&
  elsewhere.includes(fact('panel.pattern') ?? '')
    ? {
        because:
          'Ground sits on neutral at the source and at the receptacle, and not at the panel between them.',
        again: 'panel.ng.volts',
      }
    : undefined

/** Two legs and what lies between them. */
export const legs: Check = ({ amount, nominal, fact }) => {
  const [l1, l2, both] = ['l1n', 'l2n', 'l1l2'].map((pair) => amount(`panel.${pair}.volts`))
  if (l1 === undefined || l2 === undefined || both === undefined) return undefined
  const least = Math.min(l1, l2)
  if (least > 0.5 * nominal && Math.abs(both - l1) < 0.2 * nominal && Math.abs(both - l2) < 0.2 * nominal)
    return {
      because: 'Leg to leg reads the same as one leg: no split phase gives that.',
      again: 'panel.l1l2.volts',
    }
  const sum = l1 + l2
  const difference = Math.abs(l1 - l2)
  // In phase, as one source feeding both legs, the difference is what stands between them; never with a leg lifted.
  const inPhase = Math.max(l1, l2) < 1.4 * nominal ? Math.abs(difference - both) : Infinity
  const off = Math.min(Math.abs(sum - both), inPhase) / nominal
  if (fact('legs.pattern') !== 'both-dead' && off > 0.17)
    return { because: 'The two legs don’t add up to what is read leg to leg.', again: 'panel.l1l2.volts' }
  return undefined
}

/** The panel's own hot–neutral against its legs. */
export const panelAgainstLegs: Check = ({ amount, nominal }) => {
  const [hn, l1, l2] = ['hn', 'l1n', 'l2n'].map((pair) => amount(`panel.${pair}.volts`))
  if (hn === undefined || l1 === undefined || l2 === undefined) return undefined
  const nearest = Math.min(Math.abs(hn - l1), Math.abs(hn - l2)) / nominal
  return nearest > 0.2
    ? { because: 'Hot–neutral at the panel is neither of its two legs.', again: 'panel.hn.volts' }
    : undefined
}
