/**
 * What each wiring shows, said as the trade says it. Figures are common practice or follow from the parameters given;
 * the physics of each line is in the fault's row of `faults.ts`.
 */
import { describe, expect, test } from 'vitest'
import { overLimitOhms } from '../../../rules/findings/sheet.ts'
import { signs } from '../../../rules/circuit/wiring/readings/signs.ts'
import {
  european,
  foundIn,
  generatorPanel,
  inverterPanel,
  lowResistance,
  neon,
  splitGenerator,
  stationAlone,
  utilityPanel,
  wired,
} from './found-in.ts'

describe('a sound wiring', () => {
  test('reads full to ground on the hot and next to nothing on the neutral', () => {
    const [hn, hg, ng] = foundIn('sound', inverterPanel, { houseAmps: 0 }).sides()
    expect(hn).toBeCloseTo(120, 0)
    expect(hg).toBeCloseTo(120, 0)
    expect(ng).toBeLessThan(0.05)
  })
  test('lights two lamps of a tester, resistive or neon', () => {
    expect(foundIn('sound').lamps).toBe('lit/lit/dark')
    expect(foundIn('sound', european, {}, neon).lamps).toBe('lit/lit/dark')
  })
  test('loses less than 5 % under 10 A, half of what the wires lose as neutral to ground', () => {
    const { amount } = foundIn('sound', generatorPanel)
    const fall = amount('receptacle.hn.volts') - amount('receptacle.hn.volts.loaded')
    const rise = amount('receptacle.ng.volts.loaded') - amount('receptacle.ng.volts')
    const sag = amount('source.hn.volts') - amount('source.hn.volts.loaded')
    expect(fall / 120).toBeLessThan(0.05)
    expect(rise / (fall - sag)).toBeCloseTo(0.5, 1)
  })
  test('has its bond in the ohms of the source, and a winding between hot and ground', () => {
    const { amount } = foundIn('sound', generatorPanel, { bondAt: 'source' })
    expect(amount('source.ng.ohms')).toBeLessThan(0.1)
    expect(amount('receptacle.ng.ohms')).toBeLessThan(1)
    expect(amount('receptacle.hg.ohms')).toBeLessThan(3)
  })
  test('a bond relay that let go with the source reads over limit: off says nothing of running', () => {
    const { amount } = foundIn('sound', inverterPanel, { bondBy: 'relay', offLooks: 'open' })
    expect(amount('source.ng.ohms')).toBe(overLimitOhms)
    expect(amount('source.ng.volts')).toBeLessThan(1)
  })
  test('something hard-wired that stays in reads tens of ohms from hot to ground', () => {
    const { amount } = foundIn('sound', inverterPanel, {
      leftInOhms: 60,
      leftIn: 'on-circuit',
      offLooks: 'open',
    })
    expect(amount('receptacle.hg.ohms')).toBeCloseTo(60, -1)
  })
  test('ground to an independent earth is a ghost on a portable set without a rod', () => {
    const light = foundIn('sound', stationAlone).amount('receptacle.ge.volts')
    const heavy = foundIn('sound', stationAlone, {}, lowResistance).amount('receptacle.ge.volts')
    expect(light).toBeGreaterThan(10)
    expect(heavy).toBeLessThan(1)
  })
})

describe('a floating neutral', () => {
  test('reads about half to ground on both wires, and a little short', () => {
    const [hn, hg, ng] = foundIn('floating-neutral').sides()
    expect(hg / hn).toBeGreaterThan(0.42)
    expect(ng / hn).toBeGreaterThan(0.42)
    expect((hg + ng) / hn).toBeGreaterThan(0.92)
    expect((hg + ng) / hn).toBeLessThanOrEqual(1.001)
  })
  test('a quarter and three quarters where the filters differ', () => {
    const [hn, hg, ng] = foundIn('floating-neutral', inverterPanel, {
      filterSkew: 1.2,
      feederFeet: 5,
      branchFeet: 12,
      houseFilterFarads: 0,
    }).sides()
    expect(ng / hn).toBeLessThan(0.3)
    expect(hg / hn).toBeGreaterThan(0.68)
  })
  test('reads nothing on either wire with a low-resistance meter', () => {
    const [, hg, ng] = foundIn('floating-neutral', inverterPanel, {}, lowResistance).sides()
    expect(hg).toBeLessThan(5)
    expect(ng).toBeLessThan(5)
  })
  test('on two legs may read only a few volts: the legs pull against each other', () => {
    const [hn, , ng] = foundIn('floating-neutral', splitGenerator, { filterSkew: 1 }).sides()
    expect(ng / hn).toBeLessThan(0.15)
  })
  test('is dark on the bulb both ways, dim on resistive lamps, dark on neon lamps at 120 V and lit dimly at 230', () => {
    const { seen, lamps } = foundIn('floating-neutral')
    expect([seen('bulb.ng'), seen('bulb.hg')]).toEqual(['dark', 'dark'])
    expect(lamps).toBe('lit/dim/dim')
    expect(foundIn('floating-neutral', inverterPanel, {}, neon).lamps).toBe('lit/dark/dark')
    expect(foundIn('floating-neutral', european, {}, neon).lamps).not.toBe('lit/dark/dark')
  })
  test('has no ohms from neutral to ground anywhere', () => {
    const { amount } = foundIn('floating-neutral')
    for (const place of ['receptacle', 'panel', 'source'])
      expect(amount(`${place}.ng.ohms`)).toBe(overLimitOhms)
  })
})

describe('a balanced output', () => {
  test('reads halves that add up, on any meter', () => {
    for (const kit of [{}, lowResistance]) {
      const [hn, hg, ng] = foundIn('balanced-output', inverterPanel, {}, kit).sides()
      expect(hg / hn).toBeCloseTo(0.5, 1)
      expect((hg + ng) / hn).toBeCloseTo(1, 2)
    }
  })
  test('leaves the bulb at half voltage, which glows dim; through capacitors too', () => {
    for (const tie of ['wire', 'bus'] as const) {
      const { seen, amount } = foundIn('balanced-output', inverterPanel, { tie })
      expect(seen('bulb.ng')).toBe('dim')
      expect(amount('bulb.ng.volts')).toBeGreaterThan(50)
      expect(amount('bulb.ng.volts')).toBeLessThan(70)
    }
  })
  test('off, its ohms say nothing: a fraction of an ohm by a wire, over limit through electronics', () => {
    expect(
      foundIn('balanced-output', inverterPanel, { tie: 'wire', offLooks: 'winding' }).amount(
        'source.ng.ohms',
      ),
    ).toBeLessThan(2)
    expect(
      foundIn('balanced-output', inverterPanel, { tie: 'bus', offLooks: 'open' }).amount('source.ng.ohms'),
    ).toBe(overLimitOhms)
  })
})

describe('an isolated output', () => {
  test('its ground pin reads a few per cent, its case tens of volts all the same', () => {
    const { sides, amount } = foundIn('isolated-output', stationAlone)
    const [hn, hg, ng] = sides()
    expect(hg / hn).toBeLessThan(0.15)
    expect(ng / hn).toBeLessThan(0.15)
    expect(amount('source.ng.volts')).toBeGreaterThan(20)
  })
  test('behind a panel is a floating neutral to the meter', () => {
    const [hn, hg, ng] = foundIn('isolated-output', inverterPanel).sides()
    expect(hg / hn).toBeGreaterThan(0.25)
    expect(ng / hn).toBeGreaterThan(0.25)
  })
})

describe('bonds and grounds', () => {
  test('two bonds: the ground wire carries its share by resistance', () => {
    const { amount } = foundIn('double-bond', generatorPanel, { houseAmps: 10 })
    expect(amount('feeder.egc.amps')).toBeGreaterThan(2)
    expect(amount('feeder.egc.amps')).toBeLessThan(6)
    expect(amount('panel.ng.ohms')).toBeLessThan(0.1)
    expect(foundIn('sound', generatorPanel, { houseAmps: 10 }).amount('feeder.egc.amps')).toBe(0)
  })
  test('a rod as the only return: perfect volts, perfect tester, and a loop of two rods', () => {
    const { sides, lamps, amount } = foundIn('rod-only-return', generatorPanel)
    const [hn, hg] = sides()
    expect(hg / hn).toBeCloseTo(1, 2)
    expect(lamps).toBe('lit/lit/dark')
    expect(amount('receptacle.loop.ohms')).toBeGreaterThan(20)
    expect(amount('receptacle.ng.ohms')).toBeGreaterThan(20)
    expect(amount('receptacle.ng.ohms')).toBeLessThan(500)
  })
  test.each([
    [5, 0.3, 0.75],
    [10, 0.65, 0.92],
    // 1 nF to each wire, loaded by 10 MΩ and 100 pF: 56.9 of 60 V (references: 10 M ∥ 100 pF).
    [50, 0.93, 0.97],
  ])('an open ground on a stub of %i ft: the two sides add up to this part', (lastFeet, low, high) => {
    const [hn, hg, ng] = foundIn('open-ground', generatorPanel, {
      lastFeet,
      branchFeet: lastFeet * 2,
    }).sides()
    expect((hg + ng) / hn).toBeGreaterThan(low)
    expect((hg + ng) / hn).toBeLessThan(high)
  })
  test('an open ground is sound at the panel', () => {
    const [hn, hg] = foundIn('open-ground').sides('panel')
    expect(hg / hn).toBeCloseTo(1, 1)
  })
  test('a GFCI trips by its own button and not by the tester’s where the ground is open', () => {
    const { seen } = foundIn('open-ground', inverterPanel, { gfciAt: 'circuit' })
    expect([seen('gfci.own-test'), seen('gfci.plug-test')]).toEqual(['trips', 'holds'])
    expect(foundIn('sound', inverterPanel, { gfciAt: 'circuit' }).seen('gfci.plug-test')).toBe('trips')
  })
  test('a standing fault on a floating source puts neutral at full voltage to ground', () => {
    const { sides, seen } = foundIn('standing-ground-fault', generatorPanel, { faultAt: 'source' })
    const [hn, hg, ng] = sides()
    expect(hg).toBeLessThan(1)
    expect(ng / hn).toBeCloseTo(1, 1)
    expect(seen('bulb.ng')).toBe('bright')
  })
  test('a fault of the other leg: 120 across, 240 to ground, 120 on the neutral, all lamps lit', () => {
    const { sides, lamps } = foundIn('standing-ground-fault', splitGenerator, {
      faultAt: 'source',
      faultLeg: 'other',
    })
    const [hn, hg, ng] = sides()
    expect(hg / hn).toBeCloseTo(2, 1)
    expect(ng / hn).toBeCloseTo(1, 1)
    expect(lamps).toBe('lit/lit/lit')
  })
})

describe('wires open and swapped', () => {
  test('an open neutral with something plugged in reads as hot and ground swapped', () => {
    const open = foundIn('open-neutral', generatorPanel, { pluggedInOhms: 100 })
    const swapped = foundIn('hot-ground-swapped', generatorPanel)
    for (const { lamps, sides } of [open, swapped]) {
      const [hn, hg, ng] = sides()
      expect(lamps).toBe('dark/lit/lit')
      expect(hn).toBeLessThan(3)
      expect(hg).toBeGreaterThan(110)
      expect(ng).toBeGreaterThan(110)
    }
  })
  test('an open neutral with nothing plugged in still lights hot to ground', () => {
    const { sides, amount } = foundIn('open-neutral', generatorPanel)
    expect(sides()[1]).toBeGreaterThan(115)
    expect(sides()[2]).toBeLessThan(0.7 * 120)
    expect(amount('receptacle.hn.volts.loaded')).toBeLessThan(1)
  })
  test('an open hot is dead here and alive at the panel', () => {
    const { sides, lamps } = foundIn('open-hot', generatorPanel)
    expect(Math.max(...sides())).toBeLessThan(12)
    expect(lamps).toBe('dark/dark/dark')
    expect(sides('panel')[0]).toBeGreaterThan(115)
  })
  test('hot and neutral swapped: ground sits on hot', () => {
    const { sides, lamps } = foundIn('reversed-polarity', generatorPanel)
    const [hn, hg, ng] = sides()
    expect(hg).toBeLessThan(1)
    expect(ng / hn).toBeCloseTo(1, 2)
    expect(lamps).toBe('lit/dark/lit')
  })
  test('across both legs: twice the volts, one leg to ground each way, all lamps lit', () => {
    const { sides, lamps } = foundIn('two-hots', utilityPanel)
    const [hn, hg, ng] = sides()
    expect(hn / hg).toBeCloseTo(2, 1)
    expect(hn / ng).toBeCloseTo(2, 1)
    expect(lamps).toBe('lit/lit/lit')
  })
  test('a bootleg ground reads sound, and under load neutral to ground stays at nothing', () => {
    const { lamps, sides, amount } = foundIn('bootleg-ground', generatorPanel)
    expect(lamps).toBe('lit/lit/dark')
    expect(sides()[1] / sides()[0]).toBeCloseTo(1, 2)
    expect(amount('receptacle.ng.volts.loaded')).toBeLessThan(0.2)
    expect(foundIn('sound', generatorPanel).amount('receptacle.ng.volts.loaded')).toBeGreaterThan(0.5)
  })
  test('a bootleg beside a sound ground wire is a second bond', () => {
    const whole = foundIn('bootleg-ground', generatorPanel, { groundWire: 'whole' })
    expect(whole.amount('branch.egc.amps')).toBeGreaterThan(1)
  })
  test('with hot and neutral swapped as well, only an independent earth shows that all metal is live', () => {
    const { lamps, amount } = foundIn('bootleg-ground-reversed', generatorPanel)
    expect(lamps).toBe('lit/lit/dark')
    expect(amount('receptacle.ge.volts')).toBeGreaterThan(110)
    expect(signs(wired('bootleg-ground-reversed', generatorPanel)).touchAmps).toBeGreaterThan(0.03)
  })
})

describe('the feed', () => {
  test('a lost neutral: the legs move opposite ways and add up to the same', () => {
    const { amount } = foundIn('shared-neutral-lost', utilityPanel, {
      faultAt: 'feeder',
      bondAt: 'source',
      houseAmps: 2,
      houseAmpsOther: 8,
      panelRod: false,
    })
    const [l1, l2, both] = ['l1n', 'l2n', 'l1l2'].map((pair) => amount(`panel.${pair}.volts`)) as [
      number,
      number,
      number,
    ]
    // Loads in series share 240 V by their ohms: 60 Ω beside 15 Ω.
    expect(l1).toBeCloseTo(192, -1)
    expect(l2).toBeCloseTo(48, -1)
    expect(l1 + l2).toBeCloseTo(both, 0)
  })
  test('a source too low or too high shows everywhere alike', () => {
    for (const cause of ['low-source-voltage', 'high-source-voltage'] as const) {
      const { sides } = foundIn(cause, generatorPanel)
      expect(sides()[0] / sides('source')[0]).toBeCloseTo(1, 1)
      expect(Math.abs(sides('source')[0] / 120 - 1)).toBeGreaterThan(0.1)
    }
  })
  test('a source that is off reads nothing anywhere', () => {
    const { found } = foundIn('source-off', generatorPanel)
    for (const [id, value] of Object.entries(found))
      if (id.endsWith('.volts')) expect(value, id).toBeLessThan(2)
  })
})

describe('too many ohms: the rise of neutral–ground against the fall of hot–neutral', () => {
  const share = (cause: 'loose-hot' | 'loose-neutral' | 'long-run', given = {}) => {
    const { amount } = foundIn(cause, inverterPanel, { bondAt: 'panel', ...given })
    return (
      (amount('receptacle.ng.volts.loaded') - amount('receptacle.ng.volts')) /
      (amount('receptacle.hn.volts') - amount('receptacle.hn.volts.loaded'))
    )
  }
  test('a poor hot: near nothing', () => expect(share('loose-hot')).toBeLessThan(0.15))
  test('a poor neutral: near all of it', () => expect(share('loose-neutral')).toBeGreaterThan(0.75))
  test('a long run: near half', () => {
    expect(share('long-run')).toBeGreaterThan(0.38)
    expect(share('long-run')).toBeLessThan(0.52)
  })
  test('a poor neutral ahead of the bond shows nothing at the receptacle, and at the source all of it', () => {
    expect(share('loose-neutral', { faultAt: 'feeder' })).toBeLessThan(0.15)
    const { amount } = foundIn('loose-neutral', inverterPanel, {
      bondAt: 'panel',
      faultAt: 'feeder',
      houseAmps: 10,
    })
    expect(amount('source.ng.volts')).toBeGreaterThan(5)
    expect(amount('panel.ng.volts')).toBeLessThan(0.5)
  })
})

describe('how far a fault reaches, as people see it', () => {
  test.each([
    ['floating-neutral', 'source', 'everything'],
    ['open-ground', 'receptacle', 'one-receptacle'],
    ['open-ground', 'branch', 'one-circuit'],
    ['reversed-polarity', 'receptacle', 'one-receptacle'],
    ['open-hot', 'branch', 'one-circuit'],
    ['loose-hot', 'feeder', 'everything'],
    ['loose-neutral', 'branch', 'one-circuit'],
    ['source-off', 'source', 'everything'],
    ['sound', 'receptacle', undefined],
    ['bootleg-ground', 'receptacle', undefined],
  ] as const)('%s at the %s: %s', (cause, faultAt, extent) => {
    expect(signs(wired(cause, generatorPanel, { faultAt })).extent).toBe(extent)
  })
})
