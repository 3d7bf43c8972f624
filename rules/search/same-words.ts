/**
 * Words that the trade and the public use for one thing. The first of each row is the word everything is filed
 * under; it need not be the best word, only the same for all. A row is here only where mixing the words up can't
 * send anyone to the wrong article.
 */
export const sameWords: readonly { words: readonly string[]; because: string }[] = [
  {
    words: ['receptacle', 'outlet', 'socket', 'plug', 'duplex'],
    because: 'Homeowners say outlet or plug, 230 V countries say socket.',
  },
  {
    words: ['gfci', 'gfi', 'rcd', 'rccb', 'rcbo', 'elcb'],
    because: 'One device by its US, older US and 230 V names. An RCBO is one with a breaker in it.',
  },
  {
    words: ['ground', 'earth', 'earthing', 'egc', 'cpc'],
    because: 'Earth is the 230 V word; EGC and CPC are the ground wire on drawings.',
  },
  { words: ['breaker', 'mcb'], because: 'MCB is the 230 V word.' },
  {
    words: ['volt', 'v', 'vac', 'voltage'],
    because: 'People type the unit behind the number in every way there is.',
  },
  {
    words: ['amp', 'ampere', 'current'],
    because: 'As with volts; the unit’s letter is read behind a number alone.',
  },
  { words: ['ohm', 'ω', 'resistance'], because: 'As with volts; the sign is a capital omega.' },
  {
    words: ['swap', 'reverse', 'backwards', 'backward'],
    because: 'Swapped is our word for what testers and people call reversed.',
  },
  { words: ['open', 'broken', 'disconnected', 'missing'], because: 'An open wire, as people see it.' },
  { words: ['poor', 'loose', 'bad'], because: 'A poor joint is a loose one to whoever finds it.' },
  { words: ['bulb', 'lightbulb'], because: 'Written together or apart.' },
  { words: ['half', 'halfway', 'halved'], because: 'A reading of half, and ground sitting halfway.' },
  { words: ['fridge', 'refrigerator'], because: 'Written short or in full.' },
  {
    words: ['ghost', 'phantom'],
    because: 'Volts that a meter shows and no load can draw on; the trade has both words.',
  },
  { words: ['tingle', 'zap', 'tickle'], because: 'A weak shock from metal, in people’s words.' },
  { words: ['trip', 'pop', 'kick'], because: 'What a breaker does, in people’s words.' },
  { words: ['flicker', 'blink', 'pulse'], because: 'Lights that are not steady.' },
  { words: ['generator', 'genset', 'gen'], because: 'Short names for an engine generator.' },
  {
    words: ['panel', 'switchboard', 'loadcenter'],
    because: 'What holds the breakers. A box can be any box, so it is not here.',
  },
  { words: ['utility', 'grid', 'mains'], because: 'The power company’s supply.' },
  { words: ['clamp', 'clampmeter'], because: 'Written together or apart.' },
  { words: ['meter', 'multimeter', 'dmm'], because: 'The same instrument.' },
  {
    words: ['instant', 'instantly', 'immediately', 'once'],
    because: 'A breaker that trips at once trips the instant it is reset.',
  },
  { words: ['leg', 'phase'], because: 'Split phase has legs; people say phase.' },
  {
    words: [
      'not',
      'no',
      "won't",
      'wont',
      "doesn't",
      'doesnt',
      "don't",
      'dont',
      "didn't",
      "isn't",
      'isnt',
      "can't",
      'cant',
      'cannot',
      'never',
      'without',
    ],
    because: 'Does not trip, won’t trip, no trip: with and without their apostrophe.',
  },
]

/**
 * Words that help where they match and cost nothing where they don't: units, and what happens to be plugged in. An
 * article on metal that tingles need not name the fridge of whoever felt it.
 */
export const weakWords: readonly string[] =
  'not volt amp after fridge freezer washer washing dryer dishwasher machine stove oven microwave kettle toaster heater computer laptop tv house home kitchen bathroom'.split(
    ' ',
  )

/** Words too common to say anything. */
export const emptyWords: ReadonlySet<string> = new Set(
  'a am an and are as at be been but by can could did do does for from get got had has have he how i if in into is it its just me my of on or our really she should so someone something that the their them then there they this to us was we what when where which while who why will with would you your'.split(
    ' ',
  ),
)

/**
 * Volts that articles speak of. A meter shows 57.2 or 118; whoever types that looks for what is written under
 * 60 or 120. Half and whole of the three systems.
 */
export const roundVolts: readonly number[] = [60, 115, 120, 208, 230, 240]
/** A reading this near to one of them, as a part of it, is looked up under it too. */
export const roundVoltsNear = 0.06
