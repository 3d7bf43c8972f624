/**
 * What findings and exceptions rest on. `seen`: the rule was read in a copy of the standard; `memory`: from memory,
 * so check it against the adopted edition. Editions number some of these differently: local code decides.
 */
export type Section = { name: string; says: string; mark: 'seen' | 'memory' }

const section = (name: string, mark: Section['mark'], says: string): Section => ({ name, says, mark })

export const sections = {
  'nec-200.4': section('NEC 200.4(A)', 'memory', 'A neutral serves one circuit, or the set it belongs to.'),
  'nec-210.4': section(
    'NEC 210.4',
    'memory',
    'Circuits that share a neutral have their hots on different legs and are switched off together.',
  ),
  'nec-250.4': section(
    'NEC 250.4(A)(5)',
    'seen',
    'A fault needs a path of low impedance back to its source; earth is not one.',
  ),
  'nec-250.6': section(
    'NEC 250.6',
    'seen',
    'Where extra connections put current on grounding conductors, take them out, move them or interrupt the path.',
  ),
  'nec-250.20': section(
    'NEC 250.20(B)',
    'seen',
    'A system that can be grounded so that no wire stands over 150 V to ground is to be grounded.',
  ),
  'nec-250.24': section(
    'NEC 250.24, load-side grounding connections',
    'seen',
    'Past the service disconnect neutral is joined to ground nowhere again.',
  ),
  'nec-250.26': section(
    'NEC 250.26',
    'memory',
    'Which conductor is grounded: of two wires either, of three the neutral.',
  ),
  'nec-250.28': section(
    'NEC 250.28',
    'seen',
    'One main bonding jumper, unspliced, at the service disconnect.',
  ),
  'nec-250.30': section(
    'NEC 250.30(A)',
    'seen',
    'A separately derived source is bonded once; neutral is not grounded again past that bond.',
  ),
  'nec-250.30-1': section(
    'NEC 250.30(A)(1)',
    'memory',
    'That bond is at the source or in its first disconnect, where the electrode conductor connects.',
  ),
  'nec-250.32': section(
    'NEC 250.32(B)(1), Exception 1',
    'seen',
    'An existing feeder without a grounding conductor may keep the neutral bond in the outbuilding.',
  ),
  'nec-250.34': section(
    'NEC 250.34(A)',
    'seen',
    'A portable source needs no rod while it feeds plug-in loads alone and its receptacles’ grounds are tied to its frame.',
  ),
  'nec-250.34-c': section(
    'NEC 250.34(C)',
    'seen',
    'A portable source’s neutral is bonded to its frame where it is part of a separately derived system.',
  ),
  'nec-250.140': section(
    'NEC 250.140',
    'memory',
    'The frame of an existing range or dryer may stay grounded by its neutral, on the conditions listed there.',
  ),
  'nec-250.142': section(
    'NEC 250.142(B)',
    'seen',
    'Neutral does not ground cases on the load side; existing ranges and dryers excepted.',
  ),
  'nec-300.3': section('NEC 300.3(B)', 'memory', 'All conductors of one circuit run together.'),
  'nec-406.4': section(
    'NEC 406.4(D)(2)',
    'seen',
    'Where no grounding conductor is, a GFCI may serve, marked “No Equipment Ground”.',
  ),
  'nec-445.20': section(
    'NEC 445.20',
    'seen',
    'Portable generators of 15 kW or less: GFCI on 125 V receptacles where bonded; floating only beside a 125/250 V one.',
  ),
  'nec-702.11-a': section(
    'NEC 702.11(A)',
    'seen',
    'Transfer equipment that switches the neutral: separately derived, bonded at the source.',
  ),
  'nec-702.11-b': section(
    'NEC 702.11(B)',
    'seen',
    'Neutral not switched: no bond at the source, a grounding conductor to the building’s electrodes.',
  ),
  'nec-710.15': section(
    'NEC 710.15(C)',
    'seen',
    'A 120 V source may feed a 120/240 V panel only without shared neutrals and 240 V outlets, marked so.',
  ),
  'ul-943': section(
    'UL 943',
    'seen',
    'A GFCI trips at 6 mA, and on a neutral that is grounded again past it.',
  ),
  'iec-413': section(
    'IEC 60364-4-41, 413',
    'memory',
    'A separated source that feeds one item has no link to earth.',
  ),
  'iec-411.4': section(
    'IEC 60364-4-41, 411.4',
    'memory',
    'In a TN system a fault finds its way back over the protective conductor, and disconnects in time.',
  ),
  'iec-411.5': section(
    'IEC 60364-4-41, 411.5',
    'seen',
    'In a TT system an RCD disconnects: electrode ohms × rated residual current 50 V or less.',
  ),
  'iec-543.4': section(
    'IEC 60364-5-54, 543.4',
    'memory',
    'Once neutral and protective conductor are parted they are not joined again.',
  ),
  'sans-6.1.6': section('SANS 10142-1, 6.1.6', 'seen', 'No neutral-to-earth bond past the main switch.'),
  'sans-7.16.4': section(
    'SANS 10142-1, 7.16.4',
    'seen',
    'An alternate supply’s bond is switched in with it and opened on mains.',
  ),
} as const

export type SectionId = keyof typeof sections
