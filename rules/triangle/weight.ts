/** What hangs from the lamp: how hard the instrument pulls on ground. */
export type Weight = { size: 1 | 2 | 3; label: string; kind: 'meter' | 'bulb' }

/** From here on a voltage to ground may be a ghost: the meter is too light to pull it away. */
const lightMeterOhms = 1_000_000

/** "10 MΩ", "400 kΩ", "250 Ω". */
export function ohmsInWords(ohms: number): string {
  const short = (x: number) => String(Number(x.toPrecision(3)))
  if (ohms >= 1_000_000) return `${short(ohms / 1_000_000)} MΩ`
  if (ohms >= 1_000) return `${short(ohms / 1_000)} kΩ`
  return `${short(ohms)} Ω`
}

/** A meter as a weight: small from 1 MΩ up, larger below. */
export const meterWeight = (ohms: number): Weight => ({
  size: ohms >= lightMeterOhms ? 1 : 2,
  label: ohmsInWords(ohms),
  kind: 'meter',
})

/** The test bulb: the heaviest. */
export const bulbWeight: Weight = { size: 3, label: 'test bulb', kind: 'bulb' }
