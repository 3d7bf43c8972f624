import * as z from 'zod/mini'
import { ghostOrFirm } from '../circuit/instruments/ghost-or-firm.ts'
import type { GhostOrFirm, TakenWith } from '../circuit/instruments/ghost-or-firm.ts'
import { meterOf } from '../circuit/instruments/meter.ts'
import { filamentOhms } from '../circuit/instruments/test-bulb.ts'
import { chooseOne, quantity } from './quantity.ts'
import { remembered, seen, whoDecides } from './result.ts'
import type { Caution, Result, Step } from './result.ts'
import { written } from './written.ts'

const volts = quantity('the volts it showed', 0, 1000)
/** One reading, with a meter of a known input resistance or with the test bulb in its place. */
const Reading = z.discriminatedUnion(
  'with',
  [
    z.object({ with: z.literal('meter'), volts, ohms: quantity('the meter’s ohms', 100, 100_000_000) }),
    z.object({
      with: z.literal('bulb'),
      volts,
      ratedWatts: quantity('the bulb’s watts', 1, 200),
      ratedVolts: quantity('the bulb’s volts', 12, 300),
    }),
  ],
  chooseOne,
)

/** What the ghost-or-firm worksheet asks: one voltage, read twice between the same two points. */
export const GhostInputs = z.object({
  hertz: quantity('the frequency in hertz', 10, 500),
  one: Reading,
  other: Reading,
})
export type GhostInputs = z.infer<typeof GhostInputs>

const takenWith = (reading: z.infer<typeof Reading>): TakenWith =>
  reading.with === 'meter'
    ? { volts: reading.volts, meter: meterOf(reading.ohms) }
    : { volts: reading.volts, meter: { ohms: filamentOhms(reading, reading.volts), farads: 0 } }

const micro = (amps: number) => `${written(amps * 1e6)}`

/** What each outcome says. */
function said(answer: GhostOrFirm): { verdict: string; because: string[] } {
  switch (answer.kind) {
    case 'ghost':
      return {
        verdict: 'A ghost: it falls away under the heavier load.',
        because: [
          `It is coupled in through about ${written(answer.farads * 1e9)} nF from ${written(answer.openVolts)} V, and could drive ${micro(answer.amps)} µA through a wire across it.`,
          'Neither wire is tied to the other here. Which one is untied, this pair of readings does not say.',
        ],
      }
    case 'ghost-at-most':
      return {
        verdict: 'A ghost: nothing is left of it under the heavier load.',
        because: [
          `It is coupled in through no more than ${written(answer.farads * 1e9)} nF, and could drive no more than ${micro(answer.amps)} µA.`,
        ],
      }
    case 'firm':
      return {
        verdict: 'Firm, against these two instruments.',
        because: [
          `It stayed while at least ${written(answer.atLeastAmps * 1000)} mA flowed. How much more it could drive, these two readings do not say.`,
          'Firm is no leave to install a bond: a balanced output reads firm at half the voltage, and a bond to it is a short.',
        ],
      }
    case 'not-told':
      return {
        verdict: 'These two readings don’t tell.',
        because: [
          'They need one voltage of 2 V or more, read with two instruments of which one has at least four times the ohms of the other, and the heavier one may not show more than the lighter one.',
        ],
      }
  }
}

function stepsOf(light: TakenWith, heavy: TakenWith, answer: GhostOrFirm): Step[] {
  const steps: Step[] = [
    {
      name: 'What is left under the heavier load',
      formula: 'share = heavy reading ÷ light reading; firm from 0.9 up',
      filled: `${written(heavy.volts)} V ÷ ${written(light.volts)} V = ${written(light.volts > 0 ? heavy.volts / light.volts : 0)}`,
    },
  ]
  if (answer.kind === 'ghost' || answer.kind === 'ghost-at-most')
    steps.push({
      name: 'Coupling',
      formula: 'V₁²·(G₁² + ω²(C + K₁)²) = V₂²·(G₂² + ω²(C + K₂)²), solved for C',
      filled: `V₁ = ${written(light.volts)} V with ${written(light.meter.ohms)} Ω, V₂ = ${written(heavy.volts)} V with ${written(heavy.meter.ohms)} Ω: C = ${written(answer.farads * 1e9)} nF`,
    })
  if (answer.kind === 'ghost') {
    const resistive =
      (light.volts - heavy.volts) / (heavy.volts / heavy.meter.ohms - light.volts / light.meter.ohms)
    steps.push({
      name: 'If it came through a resistance instead',
      formula: 'R = (V₁ − V₂) ÷ (V₂ ÷ R₂ − V₁ ÷ R₁)',
      filled: `R = ${written(resistive / 1000)} kΩ: two voltages can’t tell the two apart`,
    })
  }
  if (answer.kind === 'firm')
    steps.push({
      name: 'Current while it stayed',
      formula: 'I = V₂ ÷ R₂',
      filled: `I = ${written(heavy.volts)} V ÷ ${written(heavy.meter.ohms)} Ω = ${written(answer.atLeastAmps * 1000)} mA`,
    })
  return steps
}

const bulbWarning: Caution = {
  word: 'warning',
  text: 'A test bulb can make metal live. For qualified people: fused leads, a filament bulb for the leg-to-leg volts, the bulb proved before and after, nobody touching metal, and never from hot to ground until the grounding conductor is known to be whole.',
}

/** Whether a voltage falls away under load, from two readings with two loads. */
export function ghostOrFirmSheet(inputs: GhostInputs): Result {
  const [a, b] = [takenWith(inputs.one), takenWith(inputs.other)]
  const [light, heavy] = a.meter.ohms >= b.meter.ohms ? [a, b] : [b, a]
  const answer = ghostOrFirm(a, b, inputs.hertz)
  const bulb = inputs.one.with === 'bulb' || inputs.other.with === 'bulb'
  return {
    judgment: answer.kind === 'not-told' ? 'depends' : 'said',
    ...said(answer),
    figures: [
      {
        label: 'Lighter load',
        value: written(light.volts),
        unit: 'V',
        note: `with ${written(light.meter.ohms)} Ω`,
      },
      {
        label: 'Heavier load',
        value: written(heavy.volts),
        unit: 'V',
        note: `with ${written(heavy.meter.ohms)} Ω`,
      },
      ...(answer.kind === 'ghost'
        ? [
            { label: 'Behind it', value: written(answer.openVolts), unit: 'V' },
            { label: 'Could drive', value: micro(answer.amps), unit: 'µA' },
          ]
        : []),
    ],
    tables: [],
    steps: stepsOf(light, heavy, answer),
    references: [
      seen('Two loads on one source behind a capacitance: solved as a circuit'),
      seen('NEMA Bulletin 88: voltages on conductors that are not connected'),
      ...(bulb ? [remembered('A filament’s resistance by its voltage: IES Lighting Handbook')] : []),
    ],
    assumptions: [
      'Both readings between the same two points, with nothing else changed between them.',
      'A meter and its leads count with 100 pF beside their resistance.',
    ],
    cautions: [
      ...(bulb ? [bulbWarning] : []),
      {
        word: 'caution',
        text: 'Ghost or firm says nothing of whether a wire is dead. Treat it as live until absence of voltage is verified (“proved dead”).',
      },
      whoDecides,
    ],
  }
}
