import type { Complex } from './network.ts'

/** Arithmetic of volts, amps, ohms and siemens with their phase. */

export const nothing: Complex = { re: 0, im: 0 }
export const plus = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im })
export const minus = (a: Complex, b: Complex): Complex => ({ re: a.re - b.re, im: a.im - b.im })
export const times = (a: Complex, b: Complex): Complex => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
})
/** The quotient; `b` is not 0. */
export function over(a: Complex, b: Complex): Complex {
  const size = b.re * b.re + b.im * b.im
  return { re: (a.re * b.re + a.im * b.im) / size, im: (a.im * b.re - a.re * b.im) / size }
}
/** An amount at a phase, in degrees. */
export const polar = (amount: number, degrees: number): Complex => ({
  re: amount * Math.cos((degrees * Math.PI) / 180),
  im: amount * Math.sin((degrees * Math.PI) / 180),
})
