import * as z from 'zod/mini'
import { mend, oneOf, quantity, rows } from './quantity.ts'
import { seen, whoDecides } from './result.ts'
import type { Result } from './result.ts'
import { written } from './written.ts'

/** One thing that is switched on, as its nameplate says. */
const Load = z.object({
  leg: oneOf(['1', '2']),
  watts: quantity('its watts', 0.5, 50_000),
})

/** What the lost-neutral worksheet asks: two legs that share a neutral, and what runs on each. */
export const LostNeutralInputs = z
  .object({
    /** Each leg to neutral while all is sound; the loads are rated for it. */
    volts: quantity('the volts of a leg', 50, 400),
    neutral: oneOf(['open', 'poor']),
    /** Of the neutral, where it is not open but poor. */
    neutralOhms: z.optional(quantity('ohms of the neutral', 0.001, 100_000)),
    loads: rows(Load, 'a load', 16),
  })
  .check((payload) => {
    const { neutral, neutralOhms } = payload.value
    if (neutral === 'poor' && neutralOhms === undefined)
      mend(payload, ['neutralOhms'], 'Type ohms of the neutral: a number from 0.001 to 100,000.')
  })
export type LostNeutralInputs = z.infer<typeof LostNeutralInputs>

/** Above this part of its rating a load is taken to burn out in minutes (common practice, no source). */
const burnsFrom = 1.2
/** Within this of its rating a load is taken to run as it should: the ±10 % of the rest of this product. */
const mayDiffer = 0.1

/** Siemens of all loads on a leg, each taken as a plain resistance. */
const siemensOf = ({ volts, loads }: LostNeutralInputs, leg: '1' | '2'): number =>
  loads.filter((load) => load.leg === leg).reduce((sum, { watts }) => sum + watts / volts ** 2, 0)

/**
 * Volts of each leg: the point where both loads meet drifts by Vn = V·(G₁ − G₂) ÷ (G₁ + G₂ + Gn), away from the leg
 * with more load; V₁ = V − Vn and V₂ = V + Vn.
 */
export function legVolts(volts: number, one: number, two: number, neutralSiemens: number) {
  const all = one + two + neutralSiemens
  const drift = all === 0 ? 0 : (volts * (one - two)) / all
  return { drift, first: volts - drift, second: volts + drift }
}

const judged = (part: number): string =>
  part >= burnsFrom
    ? 'burns out'
    : part > 1 + mayDiffer
      ? 'too high: damage'
      : part < 1 - mayDiffer
        ? 'too low: dim, motors stall'
        : 'runs as it should'

/** What each leg gets when the shared neutral is open or poor, and which side burns. */
export function lostNeutral(inputs: LostNeutralInputs): Result {
  const { volts, loads, neutral } = inputs
  const [one, two] = [siemensOf(inputs, '1'), siemensOf(inputs, '2')]
  const neutralSiemens = neutral === 'open' ? 0 : 1 / (inputs.neutralOhms ?? Number.NaN)
  const { drift, first, second } = legVolts(volts, one, two, neutralSiemens)
  const alone = one === 0 || two === 0
  const high = Math.max(first, second)
  const burning = high / volts >= burnsFrom
  const even = Math.abs(drift) <= mayDiffer * volts
  const hurt = first > second ? 1 : 2
  const loaded = neutral === 'open' && alone
  const verdict = loaded
    ? `Leg ${one === 0 ? 2 : 1} goes dark: nothing on the other leg closes its way back.`
    : even
      ? 'Both legs stay near their voltage for now.'
      : `Leg ${hurt} gets ${written(high)} V: ${burning ? 'what runs there burns out.' : 'too much for what runs there.'}`
  const because = loaded
    ? [
        `The neutral past the break stands at ${written(volts)} V through the load: it is live, though nothing runs. A meter reads ${written(2 * volts)} V on the empty leg.`,
        'The moment something is switched on on the other leg, the two share the leg-to-leg voltage.',
      ]
    : even
      ? [
          'The loads are balanced just now. Switch one off or on and the voltages run apart: an open neutral shows only then.',
        ]
      : [
          `The leg with less load gets more: the two loads lie in series across ${written(2 * volts)} V.`,
          `The shared neutral stands ${written(Math.abs(drift))} V away from where it belongs; past the break it is live.`,
        ]
  return {
    judgment: even && !loaded ? 'depends' : 'fails',
    verdict,
    because,
    figures: [
      { label: 'Leg 1', value: written(first), unit: 'V' },
      { label: 'Leg 2', value: written(second), unit: 'V' },
      { label: 'Neutral past the break', value: written(Math.abs(drift)), unit: 'V' },
      {
        label: 'Through the loads',
        value: written(second * two),
        unit: 'A',
        note: neutral === 'poor' ? 'on leg 2' : 'one current through both legs',
      },
    ],
    tables: [
      {
        title: 'Load by load',
        head: ['Load', 'Leg', 'Rated, W', 'Gets, V', 'Takes, W', 'What becomes of it'],
        rows: loads.map(({ leg, watts }, i) => {
          const gets = leg === '1' ? first : second
          return [
            `${i + 1}`,
            leg,
            written(watts),
            written(gets),
            written(watts * (gets / volts) ** 2),
            loaded ? 'dark' : judged(gets / volts),
          ]
        }),
      },
    ],
    steps: [
      {
        name: 'Resistance of each leg’s loads',
        formula: 'R = V² ÷ all its watts',
        filled: [one, two]
          .map((g, i) => `R${i + 1} = ${g === 0 ? 'without limit' : `${written(1 / g)} Ω`}`)
          .join(', '),
      },
      {
        name: 'Drift of the neutral',
        formula: 'Vn = (V ÷ R1 − V ÷ R2) ÷ (1 ÷ R1 + 1 ÷ R2 + 1 ÷ Rn)',
        filled: `Vn = (${written(volts * one)} − ${written(volts * two)}) A ÷ ${written(one + two + neutralSiemens)} S = ${written(drift)} V`,
      },
      {
        name: 'Volts of each leg',
        formula: 'V1 = V − Vn, V2 = V + Vn',
        filled: `V1 = ${written(first)} V, V2 = ${written(second)} V, together ${written(2 * volts)} V`,
      },
    ],
    references: [seen('Ohm’s law and Kirchhoff’s; textbook case of two lamps of 100 and 200 W')],
    assumptions: [
      'Every load is taken as a plain resistance. Electronics draw more current as their voltage falls and drive it further; motors and lamps differ too.',
      'What runs leg to leg (240 V) changes nothing and is left out.',
      'The ground rod is left out: with the bond on the source’s side of the break it carries part of the neutral’s current, and its metal becomes live by as much.',
    ],
    cautions: [
      {
        word: 'danger',
        text: 'Some lights bright while others dim: switch off at the main or the source now. Never open a neutral under load, and treat it as live.',
      },
      whoDecides,
    ],
  }
}
