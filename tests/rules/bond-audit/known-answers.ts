/**
 * Arrangements with the answer that the standards' rules give, written down before the audit was. Sections are the
 * NEC's unless another standard is named; which were seen and which are from memory stands in `standards.ts`.
 *
 * An answer: the mode's name, the count of bonds on the live source's neutral, then what is found. No faults: passes.
 */
import type { Part } from '../../../rules/bond-audit/system.ts'
import {
  autotransformer,
  feed,
  generator,
  groundWire,
  inverter,
  main,
  panel,
  receptacle,
  rod,
  source,
  station,
  through,
  transfer,
  transformer,
  utility,
} from './build.ts'

export type Known = {
  what: string
  /** What the answer rests on. */
  section: string
  parts: Part[]
  /** Mode → count, faults and exceptions in alphabetical order; `taken away` for one that is no mode any more. */
  modes: Record<string, string>
}

const noGround = { ground: false }
const cord = { joined: 'cord' } as const
const ownPower: ['own-power'] = ['own-power']
const bothWays: ('own-power' | 'passing-through')[] = ['own-power', 'passing-through']
const house = utility()

export const knownAnswers: Known[] = [
  // One service
  {
    what: 'a service with its screw in',
    section: '250.24, 250.28',
    parts: [house, main('utility')],
    modes: { 'On utility': '1' },
  },
  {
    what: 'a service with its screw out',
    section: '250.24, 250.28',
    parts: [house, main('utility', { bond: false })],
    modes: { 'On utility': '0 no-bond' },
  },
  {
    what: 'a subpanel with neutral and ground kept apart',
    section: '250.24, 250.142(B)',
    parts: [house, main('utility'), panel('barn', 'main')],
    modes: { 'On utility': '1' },
  },
  {
    what: 'a subpanel with its screw left in',
    section: '250.24, 250.142(B), 250.6',
    parts: [house, main('utility'), panel('barn', 'main', { bond: true })],
    modes: { 'On utility': '2 two-bonds' },
  },
  {
    what: 'two subpanels with their screws left in',
    section: '250.142(B), 250.6',
    parts: [
      house,
      main('utility'),
      panel('barn', 'main', { bond: true }),
      panel('shop', 'main', { bond: true }),
    ],
    modes: { 'On utility': '3 two-bonds' },
  },
  {
    what: 'the only bond at a subpanel',
    section: '250.24, 250.142(B)',
    parts: [house, main('utility', { bond: false }), panel('barn', 'main', { bond: true })],
    modes: { 'On utility': '1 wrong-place' },
  },
  {
    what: 'a neutral-to-ground jumper at a receptacle',
    section: '250.142(B), 250.6',
    parts: [house, main('utility'), receptacle('kitchen', 'main', { bond: 'jumper' })],
    modes: { 'On utility': '2 two-bonds' },
  },
  {
    what: 'a jumper at a receptacle that no grounding conductor reaches',
    section: '250.142(B)',
    parts: [house, main('utility'), receptacle('kitchen', feed('main', noGround), { bond: 'jumper' })],
    modes: { 'On utility': '2 two-bonds' },
  },
  {
    what: 'the only bond a jumper at a receptacle',
    section: '250.142(B), 250.24',
    parts: [house, main('utility', { bond: false }), receptacle('kitchen', 'main', { bond: 'jumper' })],
    modes: { 'On utility': '1 wrong-place' },
  },
  {
    what: 'an existing range whose frame is grounded by its neutral',
    section: '250.140, 250.142(B) Ex. 1',
    parts: [house, main('utility'), receptacle('range', feed('main', noGround), { bond: 'existing-range' })],
    modes: { 'On utility': '1 +existing-range' },
  },
  {
    what: 'a range grounded by its neutral although a grounding conductor comes along',
    section: '250.140, 250.142(B)',
    parts: [house, main('utility'), receptacle('range', 'main', { bond: 'existing-range' })],
    modes: { 'On utility': '2 two-bonds' },
  },
  {
    what: 'a receptacle without a grounding conductor behind a GFCI',
    section: '406.4(D)(2)',
    parts: [house, main('utility'), receptacle('bedroom', feed('main', noGround), { gfci: true })],
    modes: { 'On utility': '1 +no-ground-behind-gfci' },
  },
  {
    what: 'a receptacle without a grounding conductor and without a GFCI',
    section: '250.4(A)(5), 406.4(D)(2)',
    parts: [house, main('utility'), receptacle('bedroom', feed('main', noGround))],
    modes: { 'On utility': '1 ground-missing' },
  },
  {
    what: 'a receptacle whose neutral lands in another panel of the same source',
    section: '300.3(B), 200.4(A)',
    parts: [
      house,
      main('utility'),
      panel('barn', 'main'),
      receptacle('porch', 'barn', { neutralAt: 'main' }),
    ],
    modes: { 'On utility': '1 shared-neutral' },
  },

  // Outbuildings
  {
    what: 'an outbuilding on a new feeder, screw out',
    section: '250.32(B)',
    parts: [
      house,
      main('utility'),
      panel('barn', 'main', { outbuilding: { oldFeeder: false, noMetalPath: true } }),
      rod('barn'),
    ],
    modes: { 'On utility': '1' },
  },
  {
    what: 'an outbuilding with an old three-wire feeder and its screw in',
    section: '250.32(B)(1) Ex. 1',
    parts: [
      house,
      main('utility'),
      rod('main'),
      panel('barn', feed('main', noGround), {
        bond: true,
        outbuilding: { oldFeeder: true, noMetalPath: true },
      }),
      rod('barn'),
    ],
    modes: { 'On utility': '1 +outbuilding' },
  },
  {
    what: 'the same with a metal water pipe between the buildings',
    section: '250.32(B)(1) Ex. 1',
    parts: [
      house,
      main('utility'),
      panel('barn', feed('main', noGround), {
        bond: true,
        outbuilding: { oldFeeder: true, noMetalPath: false },
      }),
    ],
    modes: { 'On utility': '2 two-bonds' },
  },
  {
    what: 'the same with a grounding conductor run beside it later',
    section: '250.32(B)(1) Ex. 1',
    parts: [
      house,
      main('utility'),
      panel('barn', feed('main', noGround), {
        bond: true,
        outbuilding: { oldFeeder: true, noMetalPath: true },
      }),
      groundWire('main', 'barn'),
    ],
    modes: { 'On utility': '2 two-bonds' },
  },
  {
    what: 'the same with a ground-fault breaker ahead of the feeder',
    section: '250.32(B)(1) Ex. 1; UL 943',
    parts: [
      house,
      main('utility'),
      panel('barn', feed('main', { ground: false, gfci: true }), {
        bond: true,
        outbuilding: { oldFeeder: true, noMetalPath: true },
      }),
    ],
    modes: { 'On utility': '2 gfci-trips two-bonds' },
  },
  {
    what: 'a new feeder without a grounding conductor',
    section: '250.32(B)(1)',
    parts: [
      house,
      main('utility'),
      panel('barn', feed('main', noGround), {
        bond: true,
        outbuilding: { oldFeeder: false, noMetalPath: true },
      }),
    ],
    modes: { 'On utility': '2 two-bonds' },
  },
  {
    what: 'an outbuilding without a grounding conductor and with its screw out',
    section: '250.32(B), 250.4(A)(5)',
    parts: [
      house,
      main('utility'),
      panel('barn', feed('main', noGround), { outbuilding: { oldFeeder: true, noMetalPath: true } }),
    ],
    modes: { 'On utility': '1 ground-missing' },
  },
  {
    what: 'an outbuilding with rods as its only way back',
    section: '250.4(A)(5), 250.54',
    parts: [
      house,
      main('utility'),
      rod('main'),
      panel('barn', feed('main', noGround), { outbuilding: { oldFeeder: true, noMetalPath: true } }),
      rod('barn'),
    ],
    modes: { 'On utility': '1 rod-only' },
  },
  {
    what: 'an outbuilding with a grounding conductor run apart',
    section: '250.32(B), 250.134',
    parts: [
      house,
      main('utility'),
      panel('barn', feed('main', noGround), { outbuilding: { oldFeeder: true, noMetalPath: true } }),
      groundWire('main', 'barn'),
    ],
    modes: { 'On utility': '1' },
  },

  // An inverter by itself
  {
    what: 'an inverter bonded and its panel bonded',
    section: '250.30(A), 250.6',
    parts: [inverter({ output: 'bonded' }), panel('cabin', 'inverter', { bond: true })],
    modes: { 'On battery': '2 two-bonds' },
  },
  {
    what: 'an inverter bonded, its panel not',
    section: '250.30(A)(1)',
    parts: [inverter({ output: 'bonded' }), panel('cabin', 'inverter')],
    modes: { 'On battery': '1' },
  },
  {
    what: 'a floating inverter, its panel bonded as first disconnect',
    section: '250.30(A)(1)',
    parts: [inverter(), panel('cabin', 'inverter', { bond: true })],
    modes: { 'On battery': '1 +bonded-outside' },
  },
  {
    what: 'a floating inverter, nothing bonded',
    section: '250.20(B), 250.4(A)(5)',
    parts: [inverter(), panel('cabin', 'inverter')],
    modes: { 'On battery': '0 no-bond' },
  },
  {
    what: 'a floating inverter, bonded in the second panel only',
    section: '250.30(A)(1)',
    parts: [inverter(), panel('cabin', 'inverter'), panel('loft', 'cabin', { bond: true })],
    modes: { 'On battery': '1 wrong-place +bonded-outside' },
  },
  {
    what: 'a balanced output into a panel',
    section: '250.26, 250.20(B)',
    parts: [inverter({ output: 'balanced' }), panel('cabin', 'inverter')],
    modes: { 'On battery': '0 balanced-into-panel' },
  },
  {
    what: 'a balanced output into a bonded panel',
    section: '250.26, 250.30',
    parts: [inverter({ output: 'balanced' }), panel('cabin', 'inverter', { bond: true })],
    modes: { 'On battery': '1 balanced-into-panel bond-on-balanced' },
  },
  {
    what: 'a balanced output into a listed isolation transformer with a bonded secondary',
    section: '250.30(A)(1)',
    parts: [inverter({ output: 'balanced' }), transformer('inverter'), panel('cabin', 'transformer')],
    modes: { 'On battery': '0 +separated', 'Through transformer': '1' },
  },
  {
    what: 'an isolation transformer with nothing bonded behind it',
    section: '250.30(A)(1), 250.20(B)',
    parts: [
      inverter({ output: 'balanced' }),
      transformer('inverter', { bond: false }),
      panel('cabin', 'transformer'),
    ],
    modes: { 'On battery': '0 +separated', 'Through transformer': '0 no-bond' },
  },
  {
    what: 'an isolation transformer and its panel both bonded',
    section: '250.30(A), 250.6',
    parts: [
      inverter({ output: 'balanced' }),
      transformer('inverter'),
      panel('cabin', 'transformer', { bond: true }),
    ],
    modes: { 'On battery': '0 +separated', 'Through transformer': '2 two-bonds' },
  },
  {
    what: 'a 120 V inverter that feeds circuits with a shared neutral',
    section: '710.15(C)',
    parts: [inverter(), panel('cabin', 'inverter', { bond: true, multiwire: true })],
    modes: { 'On battery': '1 multiwire +bonded-outside' },
  },
  {
    what: 'a 120/240 V inverter that feeds circuits with a shared neutral',
    section: '210.4, 710.15(C)',
    parts: [inverter({ volts: '120/240' }), panel('cabin', 'inverter', { bond: true, multiwire: true })],
    modes: { 'On battery': '1 +bonded-outside' },
  },
  {
    what: 'a 240 V inverter with an autotransformer, its own bond relay off, the panel bonded',
    section: '250.30(A)(1), 250.26',
    parts: [
      inverter({ volts: '240', output: 'relay', relay: [] }),
      autotransformer(feed('inverter', { neutral: false })),
      panel('cabin', 'autotransformer', { bond: true }),
    ],
    modes: { 'On battery': '1' },
  },
  {
    what: 'the same with the autotransformer bonded too',
    section: '250.30(A), 250.6',
    parts: [
      inverter({ volts: '240' }),
      autotransformer(feed('inverter', { neutral: false }), { bond: 'fixed' }),
      panel('cabin', 'autotransformer', { bond: true }),
    ],
    modes: { 'On battery': '2 two-bonds' },
  },
  {
    what: 'a 240 V inverter with nothing that makes a neutral',
    section: '250.26, 250.20(B)',
    parts: [inverter({ volts: '240' }), panel('cabin', feed('inverter', { neutral: false }), { bond: true })],
    modes: { 'On battery': '0 no-neutral' },
  },
  {
    what: 'a bonded inverter, rods as the only way back from its panel',
    section: '250.4(A)(5)',
    parts: [
      inverter({ output: 'bonded' }),
      rod('inverter'),
      panel('cabin', feed('inverter', noGround)),
      rod('cabin', 25),
    ],
    modes: { 'On battery': '1 rod-only' },
  },
  {
    what: 'an inverter whose case no grounding conductor reaches',
    section: '250.4(A)(5)',
    parts: [inverter(), panel('cabin', feed('inverter', noGround), { bond: true })],
    modes: { 'On battery': '1 ground-missing +bonded-outside' },
  },

  // Two inverters into the same wires
  {
    what: 'two inverters in parallel, both with their bond relay on',
    section: '250.30(A), 250.6',
    parts: [
      source('first', { output: 'relay', relay: ownPower }),
      source('second', { output: 'relay', relay: ownPower, parallel: { with: 'first', alone: false } }),
      panel('cabin', 'first'),
    ],
    modes: { 'On first and second': '2 two-bonds' },
  },
  {
    what: 'two inverters in parallel, one bond relay on',
    section: '250.30(A)(1)',
    parts: [
      source('first', { output: 'relay', relay: ownPower }),
      source('second', { output: 'relay', parallel: { with: 'first', alone: false } }),
      panel('cabin', 'first'),
    ],
    modes: { 'On first and second': '1' },
  },
  {
    what: 'the same, where either goes on when the other stops',
    section: '250.30(A)(1), 250.4(A)(5)',
    parts: [
      source('first', { output: 'relay', relay: ownPower }),
      source('second', { output: 'relay', parallel: { with: 'first', alone: true } }),
      panel('cabin', 'first'),
    ],
    modes: { 'On first and second': '1', 'On first': '1', 'On second': '0 no-bond' },
  },

  // An inverter that passes utility through
  {
    what: 'a relay bond in a pass-through inverter, neutral switched',
    section: '250.30(A)(1), 250.24',
    parts: [
      house,
      main('utility'),
      inverter({ output: 'relay', relay: ownPower }),
      through('inverter', 'main'),
      panel('backed-up', 'inverter-transfer'),
    ],
    modes: { 'On utility': '1', 'On battery': '1' },
  },
  {
    what: 'the same with the relay closed when passing through as well',
    section: '250.24, 250.6',
    parts: [
      house,
      main('utility'),
      inverter({ output: 'relay', relay: bothWays }),
      through('inverter', 'main'),
      panel('backed-up', 'inverter-transfer'),
    ],
    modes: {
      'On utility': '2 two-bonds',
      'On utility, inverter-transfer on inverter': '1',
      'On battery': '1',
    },
  },
  {
    what: 'the same with the relay switched off',
    section: '250.4(A)(5), 250.30(A)(1)',
    parts: [
      house,
      main('utility'),
      inverter({ output: 'relay' }),
      through('inverter', 'main'),
      panel('backed-up', 'inverter-transfer'),
    ],
    modes: { 'On utility': '1', 'On battery': '0 no-bond' },
  },
  {
    what: 'a relay bond in an inverter whose neutral is solid to the service',
    section: '250.6, 702.11(B)',
    parts: [
      house,
      main('utility'),
      inverter({ output: 'relay', relay: ownPower }),
      through('inverter', 'main', { neutral: 'solid' }),
      panel('backed-up', 'inverter-transfer'),
    ],
    modes: {
      'On utility': '1',
      'On utility, inverter-transfer on inverter': '2 two-bonds',
      'On battery': '2 two-bonds',
    },
  },
  {
    what: 'an inverter without a bond whose neutral is solid to the service',
    section: '702.11(B), 250.24',
    parts: [
      house,
      main('utility'),
      inverter(),
      through('inverter', 'main', { neutral: 'solid' }),
      panel('backed-up', 'inverter-transfer'),
    ],
    modes: { 'On utility': '1', 'On battery': '1 +bonded-outside' },
  },
  {
    what: 'a backed-up panel with its screw left in',
    section: '250.24, 250.142(B)',
    parts: [
      house,
      main('utility'),
      inverter(),
      through('inverter', 'main'),
      panel('backed-up', 'inverter-transfer', { bond: true }),
    ],
    modes: {
      'On utility': '2 two-bonds',
      'On utility, inverter-transfer on inverter': '1',
      'On battery': '1 +bonded-outside',
    },
  },
  {
    what: 'a circuit moved to the backed-up panel, its neutral left in the main panel',
    section: '300.3(B), 200.4(A)',
    parts: [
      house,
      main('utility'),
      inverter({ output: 'relay', relay: ownPower }),
      through('inverter', 'main'),
      panel('backed-up', 'inverter-transfer'),
      receptacle('hall', 'backed-up', { neutralAt: 'main' }),
    ],
    modes: {
      'On utility': '1 shared-neutral',
      // Utility feeds the main panel alone then.
      'On utility, inverter-transfer on inverter': '1',
      'On battery': '1 shared-neutral',
    },
  },
  {
    what: 'an inverter left running behind a transfer switch with solid neutral',
    section: '250.6, 702.11',
    parts: [
      house,
      main('utility'),
      inverter({ output: 'relay', relay: ownPower }),
      transfer('transfer', ['main', 'inverter'], { operated: 'automatic' }),
      panel('backed-up', 'transfer'),
    ],
    modes: {
      'On utility': '1',
      'On utility, inverter running too': '2 two-bonds',
      'On battery': '2 two-bonds',
    },
  },

  {
    what: 'an inverter with a fixed strap at its output that passes utility through',
    section: '250.24, 250.6',
    parts: [
      house,
      main('utility'),
      inverter({ output: 'bonded' }),
      through('inverter', 'main'),
      panel('backed-up', 'inverter-transfer'),
    ],
    modes: {
      'On utility': '2 two-bonds',
      'On utility, inverter-transfer on inverter': '1',
      'On battery': '1',
    },
  },

  // Generators
  {
    what: 'a floating generator, neutral not switched',
    section: '702.11(B)',
    parts: [house, generator(), transfer('transfer', ['utility', 'generator']), main('transfer')],
    modes: { 'On utility': '1', 'On generator': '1' },
  },
  {
    what: 'a bonded generator, neutral not switched',
    section: '702.11(B), 250.6',
    parts: [
      house,
      generator({ type: 'standby-generator', output: 'bonded' }),
      transfer('transfer', ['utility', 'generator']),
      main('transfer'),
    ],
    modes: { 'On utility': '2 two-bonds', 'On generator': '2 two-bonds' },
  },
  {
    what: 'a bonded generator, neutral switched',
    section: '702.11(A), 250.30(A)',
    parts: [
      house,
      main('utility'),
      generator({ type: 'standby-generator', output: 'bonded' }),
      transfer('transfer', ['main', 'generator'], { neutral: 'switched' }),
      panel('backed-up', 'transfer'),
    ],
    modes: { 'On utility': '1', 'On generator': '1' },
  },
  {
    what: 'a bonded generator, neutral switched ahead of a bonded panel',
    section: '702.11(A), 250.30(A), 250.142(B)',
    parts: [
      house,
      generator({ type: 'standby-generator', output: 'bonded' }),
      transfer('transfer', ['utility', 'generator'], { neutral: 'switched' }),
      main('transfer'),
    ],
    modes: { 'On utility': '1', 'On generator': '2 two-bonds' },
  },
  {
    what: 'a floating generator, neutral switched',
    section: '702.11(A), 250.4(A)(5)',
    parts: [
      house,
      main('utility'),
      generator({ type: 'standby-generator' }),
      transfer('transfer', ['main', 'generator'], { neutral: 'switched' }),
      panel('backed-up', 'transfer'),
    ],
    modes: { 'On utility': '1', 'On generator': '0 no-bond' },
  },
  {
    what: 'a bonded GFCI generator on an inlet whose neutral is not switched',
    section: '702.11, 445.20, 250.6; UL 943',
    parts: [
      house,
      generator({ output: 'bonded', gfci: true }),
      transfer('interlock', ['utility', feed('generator', cord)]),
      main('interlock'),
    ],
    modes: {
      'On utility': '1',
      'On utility, generator plugged in': '2 two-bonds',
      'On generator': '2 gfci-trips two-bonds',
    },
  },
  {
    what: 'a floating GFCI generator on the same inlet',
    section: '702.11(B)',
    parts: [
      house,
      generator({ gfci: true }),
      transfer('interlock', ['utility', feed('generator', cord)]),
      main('interlock'),
    ],
    modes: { 'On utility': '1', 'On generator': '1' },
  },
  {
    what: 'an inlet cord without a grounding conductor',
    section: '702.11(B), 250.4(A)(5)',
    parts: [
      house,
      generator(),
      transfer('interlock', ['utility', feed('generator', { ...cord, ...noGround })]),
      main('interlock'),
    ],
    modes: { 'On utility': '1', 'On generator': '1 ground-missing' },
  },
  {
    what: 'a generator taken off its inlet for good',
    section: '250.34, 445.20',
    parts: [
      house,
      generator({ output: 'bonded', gfci: true }),
      transfer('interlock', ['utility', feed('generator', { joined: 'taken-away' })]),
      main('interlock'),
    ],
    modes: { 'On utility': '1', 'On generator': 'taken away' },
  },
  {
    what: 'a floating portable generator with plug-in loads alone',
    section: '250.34(A), 445.20',
    parts: [generator(), receptacle('tools', feed('generator', cord))],
    modes: { 'On generator': '0 +portable' },
  },
  {
    what: 'a bonded portable generator with plug-in loads alone',
    section: '250.34(A), (C), 445.20',
    parts: [generator({ output: 'bonded', gfci: true })],
    modes: { 'On generator': '1 +portable' },
  },
  {
    what: 'the house bond reached only over the generator’s and the service’s common neutral, which is cut',
    section: '250.4(A)(5), 702.11(B)',
    parts: [
      house,
      main('utility'),
      generator(),
      transfer('transfer', [feed('main', { neutral: false }), 'generator']),
      panel('backed-up', 'transfer'),
    ],
    modes: {
      'On utility': '1 neutral-missing',
      'On utility, transfer on generator': '1',
      'On generator': '0 no-bond',
    },
  },

  // Power stations
  {
    what: 'an isolated power station with plug-in loads alone',
    section: '250.34; IEC 60364-4-41 413',
    parts: [station({ output: 'isolated' })],
    modes: { 'On battery': '0 +portable' },
  },
  {
    what: 'a balanced power station with plug-in loads alone',
    section: '250.34; IEC 60364-4-41 413',
    parts: [station({ output: 'balanced' })],
    modes: { 'On battery': '0 +portable' },
  },
  {
    what: 'an isolated power station into a panel by a cord',
    section: '250.20(B), 250.4(A)(5)',
    parts: [station({ output: 'isolated' }), panel('cabin', feed('station', cord))],
    modes: { 'On battery': '0 no-bond' },
  },
  {
    what: 'an isolated power station into a bonded panel by a cord',
    section: '250.30(A)(1)',
    parts: [station({ output: 'isolated' }), panel('cabin', feed('station', cord), { bond: true })],
    modes: { 'On battery': '1 +bonded-outside' },
  },

  // 230 V
  {
    what: 'a 230 V service with its grounding conductor from the transformer (TN-S)',
    section: 'IEC 60364-1 312.2.1',
    parts: [utility({ volts: '230', output: 'bonded' }), main('utility', { bond: false })],
    modes: { 'On utility': '1' },
  },
  {
    what: 'a second neutral-to-ground link behind the main switch of such a service',
    section: 'SANS 10142-1 6.1.6',
    parts: [
      utility({ volts: '230', output: 'bonded' }),
      main('utility', { bond: false }),
      panel('annex', 'main', { bond: true }),
    ],
    modes: { 'On utility': '2 two-bonds' },
  },
  {
    what: 'a switched bond on the alternate supply, opened on mains',
    section: 'SANS 10142-1 7.16.4',
    parts: [
      utility({ volts: '230', output: 'bonded' }),
      main('utility', { bond: false }),
      inverter({ volts: '230', output: 'relay', relay: ownPower }),
      through('inverter', 'main'),
      panel('backed-up', 'inverter-transfer'),
    ],
    modes: { 'On utility': '1', 'On battery': '1' },
  },
  {
    what: 'a 230 V service with earth rods as its way back and an RCD (TT)',
    section: 'IEC 60364-4-41 411.5',
    parts: [
      utility({ volts: '230', output: 'bonded' }),
      rod('utility', 2),
      main(feed('utility', { ground: false, gfci: true }), { bond: false }),
      rod('main', 80),
    ],
    modes: { 'On utility': '1 +rod-with-rcd' },
  },
  {
    what: 'the same without an RCD',
    section: 'IEC 60364-4-41 411.5',
    parts: [
      utility({ volts: '230', output: 'bonded' }),
      rod('utility', 2),
      main(feed('utility', noGround), { bond: false }),
      rod('main', 80),
    ],
    modes: { 'On utility': '1 rod-only' },
  },

  // Several sources
  {
    what: 'utility, inverter and generator, the generator’s neutral switched, one bond in each',
    section: '250.24, 250.30(A), 702.11(A)',
    parts: [
      house,
      main('utility'),
      generator({ type: 'standby-generator', output: 'bonded' }),
      transfer('transfer', ['main', 'generator'], { neutral: 'switched' }),
      inverter({ output: 'relay', relay: ownPower }),
      through('inverter', 'transfer'),
      panel('backed-up', 'inverter-transfer'),
    ],
    modes: { 'On utility': '1', 'On generator': '1', 'On battery': '1' },
  },
]
