/** American sizes from 18 AWG to 2000 kcmil, thinnest first, with their circular mils (NEC chapter 9 table 8). */
export const circularMils = {
  '18': 1620,
  '16': 2580,
  '14': 4110,
  '12': 6530,
  '10': 10380,
  '8': 16510,
  '6': 26240,
  '4': 41740,
  '3': 52620,
  '2': 66360,
  '1': 83690,
  '1/0': 105600,
  '2/0': 133100,
  '3/0': 167800,
  '4/0': 211600,
  '250': 250000,
  '300': 300000,
  '350': 350000,
  '400': 400000,
  '500': 500000,
  '600': 600000,
  '750': 750000,
  '900': 900000,
  '1000': 1000000,
  '1250': 1250000,
  '1750': 1750000,
  '2000': 2000000,
} as const
export type Size = keyof typeof circularMils

const byArea = (Object.entries(circularMils) as [Size, number][]).sort(([, a], [, b]) => a - b)
/** All of them, thinnest first. */
export const sizes = byArea.map(([size]) => size) as [Size, ...Size[]]

/** The thinnest size of at least this many circular mils; undefined beyond the largest. */
export const sizeOfArea = (mils: number): Size | undefined =>
  byArea.find(([, area]) => area >= mils * (1 - 1e-9))?.[0]

/** The thicker of two. */
export const thicker = (a: Size, b: Size): Size => (circularMils[a] >= circularMils[b] ? a : b)
/** The thinner of two. */
export const thinner = (a: Size, b: Size): Size => (circularMils[a] <= circularMils[b] ? a : b)

/** "12 AWG", "350 kcmil". */
export const inWords = (size: Size): string => `${size} ${circularMils[size] >= 250_000 ? 'kcmil' : 'AWG'}`
