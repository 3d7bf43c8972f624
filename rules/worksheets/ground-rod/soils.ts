/** Soils and their resistivity in ohm-meters: least, average, most. National Bureau of Standards, Technical Report 108. */
export const soils = {
  fill: { label: 'Ashes, cinders, brine waste', least: 5.9, average: 23.7, most: 70 },
  clay: { label: 'Clay, shale, loam', least: 3.4, average: 40.6, most: 163 },
  mixed: { label: 'The same with sand and gravel', least: 10.2, average: 158, most: 1350 },
  gravel: { label: 'Gravel, sand, stones, little clay', least: 590, average: 940, most: 4580 },
} as const
export type Soil = keyof typeof soils
export const soilNames = Object.keys(soils) as [Soil, ...Soil[]]
