import { performance } from 'node:perf_hooks'
import { auditSystem } from '../../rules/bond-audit/audit.ts'
import { checkSystem } from '../../rules/bond-audit/check-system.ts'
import { productOfStates } from '../../rules/bond-audit/modes.ts'
import { mostParts, mostSources } from '../../rules/bond-audit/system.ts'
import type { Feed, Part, Source, System } from '../../rules/bond-audit/system.ts'

const feed = (from: string, joined: Feed['joined']): Feed => ({
  from,
  joined,
  neutral: true,
  ground: true,
  gfci: true,
  run: { length: 50, neutral: '10', ground: '12', metal: 'copper' },
})
const named = (id: string) => ({ id, name: id })

/**
 * The most a form can hold: behind utility's panel every further source has a bond relay, goes by turns behind a
 * transfer switch inside itself or a separate one that leaves the neutral joined, and is plugged in by a cord; what
 * is left of the parts are panels on cords, receptacles with GFCI and rods.
 */
function fullSystem(sources: number): System {
  const source = (id: string, more: Partial<Source>): Source => ({
    kind: 'source',
    ...named(id),
    type: 'inverter',
    volts: '120/240',
    output: 'relay',
    relay: ['own-power', 'passing-through'],
    gfci: true,
    ...more,
  })
  const parts: Part[] = [
    source('utility', { type: 'utility', output: 'floating', relay: [] }),
    {
      kind: 'panel',
      ...named('main'),
      role: 'main',
      feed: feed('utility', 'wired'),
      bond: true,
      multiwire: true,
    },
  ]
  let last = 'main'
  for (let i = 1; i < sources; i++) {
    const builtIn = i % 2 === 1
    const [own, transfer, panel] = [`source-${i}`, `transfer-${i}`, `panel-${i}`]
    parts.push(
      source(own, { type: builtIn ? 'inverter' : 'portable-generator' }),
      {
        kind: 'switch',
        ...named(transfer),
        operated: builtIn ? 'built-in' : 'manual',
        ...(builtIn && { inverter: own }),
        neutral: 'solid',
        inputs: [feed(own, builtIn ? 'wired' : 'cord'), feed(last, 'cord')],
      },
      {
        kind: 'panel',
        ...named(panel),
        role: 'sub',
        feed: feed(transfer, 'wired'),
        bond: i === 1,
        multiwire: true,
      },
    )
    last = panel
  }
  for (let i = 0; parts.length < mostParts; i++) {
    const [id, from] = [`end-${i}`, i % 2 === 0 ? 'main' : last]
    parts.push(
      i % 3 === 0
        ? {
            kind: 'panel',
            ...named(id),
            role: 'sub',
            feed: feed(from, 'cord'),
            bond: false,
            multiwire: false,
          }
        : i % 3 === 1
          ? { kind: 'receptacle', ...named(id), feed: feed(from, 'wired'), gfci: true, bond: 'none' }
          : { kind: 'rod', ...named(id), at: from, ohms: 30 },
    )
  }
  return { name: 'full', units: 'us', parts }
}

/** The bond audit of systems as large as the form allows: modes, states looked at, their product, and milliseconds. */
export function measureAudit(): void {
  console.log(`\nbond audit, ${mostParts} parts with every switch, relay and cord the form allows\n`)
  console.log('sources   modes listed   states looked at   product of positions   median')
  for (let i = 0; i < 20; i++) auditSystem(fullSystem(mostSources)) // compiled before anything is timed
  for (let sources = 1; sources <= mostSources; sources++) {
    const system = fullSystem(sources)
    const faults = checkSystem(system)
    if (faults.length > 0) throw new Error(JSON.stringify(faults))
    const times: number[] = []
    let audit = auditSystem(system)
    for (let i = 0; i < 41; i++) {
      const start = performance.now()
      audit = auditSystem(system)
      times.push(performance.now() - start)
    }
    const median = times.sort((a, b) => a - b)[20] ?? NaN
    console.log(
      [
        String(sources).padStart(7),
        String(audit.modes.length).padStart(15),
        String(audit.states).padStart(19),
        productOfStates(system).toLocaleString('en-US').padStart(23),
        `${median.toFixed(1)} ms`.padStart(9),
      ].join(''),
    )
  }
}
