/** The marks an address writes things with. Their order is part of version 1: add at the end, never between. */
import { gauges, millimeters } from '../system.ts'

export const joinedWays = ['wired', 'cord', 'taken-away'] as const
export const kinds = [
  'source',
  'transformer',
  'autotransformer',
  'switch',
  'panel',
  'receptacle',
  'rod',
  'ground-wire',
] as const
export const types = [
  'utility',
  'inverter',
  'power-station',
  'portable-generator',
  'standby-generator',
] as const
export const voltages = ['120', '120/240', '240', '230'] as const
export const outputs = ['bonded', 'relay', 'floating', 'balanced', 'isolated'] as const
export const operated = ['automatic', 'manual', 'built-in'] as const
export const neutrals = ['switched', 'solid'] as const
export const fixedBonds = ['none', 'fixed', 'relay'] as const
export const roles = ['main', 'sub'] as const
export const receptacleBonds = ['none', 'jumper', 'existing-range'] as const
export const sizes = [...new Set<string>([...gauges, ...millimeters])]

export const text = (words: string) =>
  encodeURIComponent(words.replace(/[\ud800-\udfff]/gu, ''))
    .replace(/[-_.!~*'()]/g, (mark) => `%${mark.charCodeAt(0).toString(16)}`)
    .replace(/%20/g, '-')
    .replace(/%/g, '*')
export const untext = (words: string) => decodeURIComponent(words.replace(/\*/g, '%').replace(/-/g, '%20'))
export const number = (value: number) => String(value).replace('.', '-')
export const unnumber = (value: string | undefined) => Number((value ?? 'x').replace('-', '.'))
export const flag = (value: boolean) => (value ? '1' : '0')
/** A part's id as its name would give it: then it need not be written. */
export const idFrom = (name: string) =>
  name
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-|-$/g, '') || 'part'
export const nowhere = 'nothing'

export const nth = <T>(all: readonly T[], index: string | undefined): T | undefined =>
  all[parseInt(index ?? '', 36)]
export const place = <T>(all: readonly T[], one: T) => all.indexOf(one).toString(36)
