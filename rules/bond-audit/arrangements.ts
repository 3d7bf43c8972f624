/** Common arrangements to start from. Generic trade descriptions; names are what stands on a label at the site. */
import type { Feed, Panel, Part, Receptacle, Run, Source, Switch, System } from './system.ts'

export type Arrangement = { id: string; title: string; what: string; system: System }

const run = (length: number, neutral = '10', ground = '10'): Run => ({
  length,
  neutral,
  ground,
  metal: 'copper',
})
const feed = (from: string, more: Partial<Feed> = {}): Feed => ({
  from,
  joined: 'wired',
  neutral: true,
  ground: true,
  gfci: false,
  ...more,
})
const own = (from: string): Feed => feed(from)

const source = (id: string, name: string, more: Partial<Source>): Source => ({
  kind: 'source',
  id,
  name,
  type: 'inverter',
  volts: '120/240',
  output: 'floating',
  relay: [],
  gfci: false,
  ...more,
})
const service = source('utility', 'Utility', { type: 'utility' })
const panel = (id: string, name: string, from: Feed, more: Partial<Panel> = {}): Panel => ({
  kind: 'panel',
  id,
  name,
  role: 'sub',
  feed: from,
  bond: false,
  multiwire: false,
  ...more,
})
const mainPanel = (from: Feed) => panel('main-panel', 'Main panel', from, { role: 'main', bond: true })
const transfer = (id: string, name: string, inputs: Feed[], more: Partial<Switch> = {}): Switch => ({
  kind: 'switch',
  id,
  name,
  operated: 'manual',
  neutral: 'solid',
  inputs,
  ...more,
})
const inside = (inverter: string, name: string, from: Feed): Switch =>
  transfer(`${inverter}-transfer`, name, [own(inverter), from], {
    operated: 'built-in',
    inverter,
    neutral: 'switched',
  })
const receptacle = (id: string, name: string, from: Feed, more: Partial<Receptacle> = {}): Receptacle => ({
  kind: 'receptacle',
  id,
  name,
  feed: from,
  gfci: false,
  bond: 'none',
  ...more,
})
const rod = (at: string, name: string): Part => ({ kind: 'rod', id: `rod-${at}`, name, at, ohms: 30 })
const arrangement = (id: string, title: string, what: string, parts: Part[]): Arrangement => ({
  id,
  title,
  what,
  system: { name: title, units: 'us', parts },
})

const fed = (from: string, feet: number) => feed(from, { run: run(feet) })
const serviceWires = feed('utility', { run: run(40, '2/0', '4') })

export const arrangements: readonly Arrangement[] = [
  arrangement(
    'cabin-inverter',
    'Cabin on one inverter',
    'A hard-wired 120 V inverter feeds a cabin’s panel; no utility.',
    [
      source('inverter', 'Inverter', { volts: '120', output: 'bonded' }),
      panel('cabin-panel', 'Cabin panel', fed('inverter', 12), { bond: true }),
      rod('cabin-panel', 'Cabin rod'),
    ],
  ),
  arrangement(
    'pass-through',
    'House with a pass-through inverter',
    'A hard-wired inverter with a bond relay passes utility through to a backed-up panel.',
    [
      service,
      mainPanel(serviceWires),
      source('inverter', 'Inverter', { output: 'relay', relay: ['own-power'] }),
      inside('inverter', 'Inverter transfer', fed('main-panel', 20)),
      panel('backed-up-panel', 'Backed-up panel', fed('inverter-transfer', 30)),
      rod('main-panel', 'House rod'),
    ],
  ),
  arrangement(
    'inlet-generator',
    'Portable generator on an inlet',
    'A bonded generator with GFCI receptacles, plugged into an inlet with interlocked breakers; neutral not switched.',
    [
      service,
      source('generator', 'Generator', { type: 'portable-generator', output: 'bonded', gfci: true }),
      transfer('interlock', 'Interlocked breakers', [
        serviceWires,
        feed('generator', { joined: 'cord', run: run(25, '10', '10') }),
      ]),
      mainPanel(feed('interlock')),
      rod('main-panel', 'House rod'),
    ],
  ),
  arrangement(
    'standby-switched',
    'Standby generator, neutral switched',
    'A permanently installed generator, bonded in itself; a transfer switch that moves the neutral too.',
    [
      service,
      mainPanel(serviceWires),
      source('generator', 'Standby generator', { type: 'standby-generator', output: 'bonded' }),
      transfer('transfer', 'Transfer switch', [fed('main-panel', 15), fed('generator', 60)], {
        operated: 'automatic',
        neutral: 'switched',
      }),
      panel('backed-up-panel', 'Backed-up panel', fed('transfer', 10)),
      rod('generator', 'Generator rod'),
      rod('main-panel', 'House rod'),
    ],
  ),
  arrangement(
    'standby-solid',
    'Standby generator, neutral not switched',
    'A floating generator on a two-pole transfer switch; the service’s bond serves both.',
    [
      service,
      source('generator', 'Standby generator', { type: 'standby-generator' }),
      transfer('transfer', 'Transfer switch', [serviceWires, fed('generator', 60)], {
        operated: 'automatic',
      }),
      mainPanel(feed('transfer')),
      rod('main-panel', 'House rod'),
    ],
  ),
  arrangement(
    'power-station-panel',
    'Power station into a panel',
    'A portable power station with an isolated output, plugged into a small panel by a cord.',
    [
      source('station', 'Power station', { type: 'power-station', volts: '120', output: 'isolated' }),
      panel('shed-panel', 'Shed panel', feed('station', { joined: 'cord', run: run(10, '12', '12') })),
    ],
  ),
  arrangement(
    'balanced-panel',
    'Balanced inverter into a panel',
    'A small inverter whose two wires both stand at half voltage, wired to a panel.',
    [
      source('inverter', 'Inverter', { volts: '120', output: 'balanced' }),
      panel('van-panel', 'Van panel', fed('inverter', 8)),
    ],
  ),
  arrangement(
    'balanced-transformer',
    'Balanced inverter with an isolation transformer',
    'The same, with a listed isolation transformer whose secondary is bonded.',
    [
      source('inverter', 'Inverter', { volts: '120', output: 'balanced' }),
      {
        kind: 'transformer',
        id: 'transformer',
        name: 'Isolation transformer',
        feed: fed('inverter', 5),
        volts: '120',
        bond: true,
      },
      panel('van-panel', 'Van panel', fed('transformer', 8)),
    ],
  ),
  arrangement(
    'two-inverters',
    'Two inverters in parallel',
    'Two inverters on one panel, either of which goes on when the other stops.',
    [
      source('inverter-a', 'Inverter A', { output: 'relay', relay: ['own-power'] }),
      source('inverter-b', 'Inverter B', {
        output: 'relay',
        relay: ['own-power'],
        parallel: { with: 'inverter-a', alone: true },
      }),
      panel('house-panel', 'House panel', fed('inverter-a', 20)),
      rod('house-panel', 'House rod'),
    ],
  ),
  arrangement(
    'autotransformer',
    '240 V inverter with an autotransformer',
    'Two hots without a neutral; an autotransformer makes one. The panel is bonded, the inverter’s relay off.',
    [
      source('inverter', 'Inverter', { volts: '240', output: 'relay' }),
      {
        kind: 'autotransformer',
        id: 'autotransformer',
        name: 'Autotransformer',
        feed: feed('inverter', { neutral: false, run: run(6, '6', '8') }),
        bond: 'none',
      },
      panel('house-panel', 'House panel', fed('autotransformer', 10), { bond: true, multiwire: true }),
    ],
  ),
  arrangement(
    'multiwire-120',
    '120 V inverter on shared neutrals',
    'A 120 V inverter on both bars of a panel whose circuits share neutrals.',
    [
      source('inverter', 'Inverter', { volts: '120' }),
      panel('cabin-panel', 'Cabin panel', fed('inverter', 12), { bond: true, multiwire: true }),
    ],
  ),
  arrangement(
    'subpanel',
    'Subpanel with its screw left in',
    'A garage subpanel on a four-wire feeder, its bond screw still in.',
    [
      service,
      mainPanel(serviceWires),
      panel('garage-panel', 'Garage panel', feed('main-panel', { run: run(100, '6', '10') }), { bond: true }),
      rod('main-panel', 'House rod'),
    ],
  ),
  arrangement(
    'old-outbuilding',
    'Outbuilding on an old feeder',
    'A barn on a three-wire feeder from before grounding conductors were asked for.',
    [
      service,
      mainPanel(serviceWires),
      panel('barn-panel', 'Barn panel', feed('main-panel', { ground: false, run: run(150, '4', '8') }), {
        bond: true,
        outbuilding: { oldFeeder: true, noMetalPath: true },
      }),
      rod('main-panel', 'House rod'),
      rod('barn-panel', 'Barn rod'),
    ],
  ),
  arrangement(
    'plug-in-generator',
    'Portable generator, plug-in loads',
    'A floating generator with tools plugged into it and nothing else.',
    [
      source('generator', 'Generator', { type: 'portable-generator' }),
      receptacle('tools', 'Tool cord', feed('generator', { joined: 'cord' })),
    ],
  ),
  arrangement(
    'three-sources',
    'Utility, generator and inverter',
    'A standby generator by a transfer switch, then an inverter that passes either through.',
    [
      service,
      mainPanel(serviceWires),
      source('generator', 'Standby generator', { type: 'standby-generator', output: 'bonded' }),
      transfer('transfer', 'Transfer switch', [fed('main-panel', 15), fed('generator', 60)], {
        operated: 'automatic',
        neutral: 'switched',
      }),
      source('inverter', 'Inverter', { output: 'relay', relay: ['own-power'] }),
      inside('inverter', 'Inverter transfer', fed('transfer', 10)),
      panel('backed-up-panel', 'Backed-up panel', fed('inverter-transfer', 30)),
      rod('main-panel', 'House rod'),
    ],
  ),
]
