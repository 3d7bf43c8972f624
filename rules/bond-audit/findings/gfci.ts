import type { Circuit } from '../circuit.ts'
import type { Finding } from '../findings.ts'
import { straddled } from '../paths.ts'
import { takeOut } from './bond-changes.ts'
import { bondWords, listed } from '../phrases.ts'

/** Ground-fault protection between two bonds: part of the neutral current passes it by. */
export const gfciFindings = (circuit: Circuit): Finding[] =>
  straddled(circuit).map(({ at, ahead, behind }) => ({
    kind: 'gfci-trips',
    parts: [at.id],
    says: `Neutral is grounded again behind the GFCI of ${at.name}, by ${listed(behind.map(bondWords))}; ahead of it by ${listed(ahead.map(bondWords))}.`,
    danger:
      'Part of the neutral current goes back by ground, so the GFCI trips with the first load, or with none. Whoever takes it out loses its protection and keeps the two bonds.',
    // The service's own bond is never the one that goes.
    change: [
      'Leave the GFCI in.',
      ...[...behind, ...ahead]
        .filter(({ part }) => !(part.kind === 'panel' && part.role === 'main'))
        .flatMap((bond) => takeOut(circuit, bond)),
    ],
    sections: ['ul-943', 'nec-250.6'],
  }))
