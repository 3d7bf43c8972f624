import type { Check } from './contradiction.ts'

/** The bulb’s look against the volts across it, and against the meter. */
export const bulbAgainstMeter: Check = ({ observed, amount, nominal, fact }) => {
  const [look, volts] = [observed('bulb.ng'), amount('bulb.ng.volts')]
  if (look !== undefined && volts !== undefined) {
    const part = volts / nominal
    if (
      (look === 'bright' && part < 0.4) ||
      (look === 'dark' && part > 0.75) ||
      (look === 'dim' && part < 0.03)
    )
      return {
        because: 'The test bulb’s look and the volts across it tell different stories.',
        again: 'bulb.ng.volts',
      }
  }
  if (fact('receptacle.pattern') === 'on-neutral' && (look === 'bright' || (volts ?? 0) > 0.75 * nominal))
    return {
      because: 'The test bulb is bright between neutral and ground where the meter reads nothing.',
      again: 'bulb.ng',
    }
  return undefined
}

/** A split phase is bonded in its middle: half on the bulb from one leg’s two wires can’t be. */
export const bulbOnTwoLegs: Check = ({ fact, legs }) =>
  legs === 2 && fact('source-bulb.holds') === 'half'
    ? {
        because:
          'The bulb keeps half both ways: a balanced output, which no 120/240 V source is. Look at what the source is.',
        again: 'source.bulb.ng.volts',
      }
    : undefined

const hung = [
  ['bulb.ng.volts', 'receptacle.ng.volts'],
  ['source.bulb.ng.volts', 'source.ng.volts'],
  ['source.bulb.hg.volts', 'source.hg.volts'],
] as const

/** A bulb pulls harder than any meter: it can’t keep more volts than the meter read without it. */
export const bulbAboveMeter: Check = ({ amount, nominal }) => {
  for (const [bulb, meter] of hung) {
    const [across, without] = [amount(bulb), amount(meter)]
    if (across !== undefined && without !== undefined && across > without + 0.15 * nominal)
      return { because: 'The test bulb keeps more volts than the meter read without it.', again: meter }
  }
  return undefined
}

const looked = [
  ['bulb.ng', 'receptacle.ng.volts'],
  ['bulb.hg', 'receptacle.hg.volts'],
] as const

/** A bright bulb has three quarters of nominal or more across it, and the meter must have read that. */
export const bulbBrightOnFewVolts: Check = ({ amount, observed, nominal, legs }) => {
  for (const [bulb, meter] of looked) {
    const volts = amount(meter)
    if (observed(bulb) === 'bright' && volts !== undefined && volts < 0.6 * nominal)
      return { because: 'The test bulb is bright where the meter reads little.', again: meter }
  }
  const live = (amount('receptacle.hn.volts') ?? 0) > 0.7 * nominal
  return legs === 1 && live && observed('bulb.ng') === 'bright' && observed('bulb.hg') === 'bright'
    ? {
        because: 'The test bulb is bright from ground to both wires: two wires can’t do that.',
        again: 'bulb.ng',
      }
    : undefined
}
