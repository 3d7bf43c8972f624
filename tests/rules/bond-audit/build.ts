/** Short ways to write a system down in a test. */
import type {
  Autotransformer,
  Feed,
  GroundWire,
  Panel,
  Part,
  Receptacle,
  Rod,
  Source,
  Switch,
  System,
  Transformer,
} from '../../../rules/bond-audit/system.ts'

type Some<Kind> = Partial<Omit<Kind, 'kind' | 'feed' | 'inputs'>>
const named = (id: string) => ({ id, name: id })

export const feed = (from: string, more: Partial<Feed> = {}): Feed => ({
  from,
  joined: 'wired',
  neutral: true,
  ground: true,
  gfci: false,
  ...more,
})
type From = string | Feed
const fed = (from: From): Feed => (typeof from === 'string' ? feed(from) : from)

export const source = (id: string, more: Some<Source> = {}): Source => ({
  kind: 'source',
  ...named(id),
  type: 'inverter',
  volts: '120/240',
  output: 'floating',
  relay: [],
  gfci: false,
  ...more,
})
export const utility = (more: Some<Source> = {}) => source('utility', { type: 'utility', ...more })
export const generator = (more: Some<Source> = {}) =>
  source('generator', { type: 'portable-generator', ...more })
export const inverter = (more: Some<Source> = {}) => source('inverter', { volts: '120', ...more })
export const station = (more: Some<Source> = {}) =>
  source('station', { type: 'power-station', volts: '120', ...more })

export const panel = (id: string, from: From, more: Some<Panel> = {}): Panel => ({
  kind: 'panel',
  ...named(id),
  role: 'sub',
  feed: fed(from),
  bond: false,
  multiwire: false,
  ...more,
})
export const main = (from: From, more: Some<Panel> = {}): Panel =>
  panel('main', from, { role: 'main', bond: true, ...more })

export const transfer = (id: string, inputs: From[], more: Some<Switch> = {}): Switch => ({
  kind: 'switch',
  ...named(id),
  operated: 'manual',
  neutral: 'solid',
  inputs: inputs.map(fed),
  ...more,
})
/** The transfer relay inside an inverter: its own output first. */
export const through = (own: string, from: From, more: Some<Switch> = {}): Switch =>
  transfer(`${own}-transfer`, [own, from], {
    operated: 'built-in',
    inverter: own,
    neutral: 'switched',
    ...more,
  })

export const receptacle = (id: string, from: From, more: Some<Receptacle> = {}): Receptacle => ({
  kind: 'receptacle',
  ...named(id),
  feed: fed(from),
  gfci: false,
  bond: 'none',
  ...more,
})
export const transformer = (from: From, more: Some<Transformer> = {}): Transformer => ({
  kind: 'transformer',
  ...named('transformer'),
  feed: fed(from),
  volts: '120',
  bond: true,
  ...more,
})
export const autotransformer = (from: From, more: Some<Autotransformer> = {}): Autotransformer => ({
  kind: 'autotransformer',
  ...named('autotransformer'),
  feed: fed(from),
  bond: 'none',
  ...more,
})
export const rod = (at: string, ohms = 30): Rod => ({ kind: 'rod', ...named(`rod-${at}`), at, ohms })
export const groundWire = (from: string, to: string): GroundWire => ({
  kind: 'ground-wire',
  ...named(`wire-${from}-${to}`),
  from,
  to,
})
export const system = (...parts: Part[]): System => ({ name: 'Test', units: 'us', parts })
