/** How the picture and its words say amps and volts: no more digits than a model deserves. */

const digits = (x: number, n: number) => String(Number(x.toPrecision(n)))

/** "410 A", "9.6 A", "60 mA", "0.04 mA"; below a hundredth of a milliamp "next to nothing". */
export function inAmps(amps: number): string {
  if (amps >= 0.0995) return `${digits(amps, 2)} A`
  if (amps >= 0.00001) return `${amps * 1000 < 1 ? digits(amps * 1000, 1) : digits(amps * 1000, 2)} mA`
  return 'next to nothing'
}

/** "118 V", "7.5 V", "0.3 V". */
export const inVolts = (volts: number): string =>
  volts >= 99.5 ? `${Math.round(volts)} V` : volts >= 0.095 ? `${digits(volts, 2)} V` : '0 V'
