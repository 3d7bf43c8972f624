/** The worksheets as they are listed: by what is asked. The bond audit is a page of its own among them. */
export const sheetList = [
  {
    title: 'Bonds',
    sheets: [
      {
        to: 'bond-audit',
        name: 'Bond audit',
        asks: 'Is there exactly one bond in every operating mode?',
      },
    ],
  },
  {
    title: 'Faults and shock',
    sheets: [
      {
        to: 'fault-clearing',
        name: 'What clears a fault',
        asks: 'Does the breaker trip, does the source stop, or does metal stay live?',
      },
      {
        to: 'trip-time',
        name: 'GFCI and RCD trip time',
        asks: 'How long may it take at this current to ground?',
      },
      {
        to: 'lost-neutral',
        name: 'Lost neutral',
        asks: 'Two legs, their neutral open or poor: which side burns?',
      },
      { to: 'ghost-or-firm', name: 'Ghost or firm', asks: 'Does this voltage fall away under a load?' },
    ],
  },
  {
    title: 'Wires and rods',
    sheets: [
      { to: 'voltage-drop', name: 'Voltage drop', asks: 'How much of the voltage do the wires use up?' },
      { to: 'ground-rod', name: 'Ground rod', asks: 'How many ohms to earth, with one rod or several?' },
      {
        to: 'grounding-sizes',
        name: 'Grounding conductor sizes',
        asks: 'How thick, behind this breaker or for this service?',
      },
    ],
  },
] as const
