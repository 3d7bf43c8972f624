/**
 * The shape of an edition: what diagnosis needs (one file, the same for everyone) and, by audience,
 * procedures and articles. Parsed with zod/mini, because the browser parses editions too.
 */
import * as z from 'zod/mini'
import { Audience } from './audience.ts'
import { Condition } from './condition.ts'

const id = z
  .string()
  .check(z.regex(/^[a-z0-9]+([.-][a-z0-9]+)*$/, 'id must be lower case words joined by . or -'))
const text = z.string().check(z.minLength(1, 'must not be empty'))
const label = z.string().check(z.minLength(1), z.maxLength(24, 'label must have 24 characters or fewer'))

export const Hazard = z.enum(['closed', 'closed-can-energize', 'open-dead', 'open-live'])
/** Who may do a test: anyone with nothing opened, or a qualified person. */
export const Who = z.enum(['anyone', 'qualified'])

const Named = z.strictObject({ id: text, label: text, short: z.optional(label) })

export const Reading = z.strictObject({
  id,
  label,
  help: z.string(),
  unit: z.enum(['V', 'V DC', 'Ω', 'MΩ', 'A', 'mA', 'Hz', 'ms']),
  place: z.enum(['receptacle', 'panel', 'source', 'feeder', 'branch', 'rod']),
  /** The two points probed: 'hn', 'ng', 'hg', 'l1n' …; absent for clamps and ratings. */
  pair: z.optional(text),
  loaded: z.optional(z.boolean()),
  /** Taken with the source off and proved dead. */
  dead: z.optional(z.boolean()),
  systems: z.optional(z.array(text)),
  wirings: z.optional(z.array(text)),
})

export const Observation = z.strictObject({
  id,
  label,
  help: z.string(),
  values: z.array(z.strictObject({ id: text, label })).check(z.minLength(2)),
})

export const Cause = z.strictObject({
  id,
  label,
  title: text,
  /** Marked electrical in the catalogue: what `--priors flat` spreads over. */
  electrical: z.boolean(),
  /** Where alone this can occur; absent parts are unrestricted. Only what can't be is excluded. */
  possible: z.optional(
    z.strictObject({
      sources: z.optional(z.array(text)),
      systems: z.optional(z.array(text)),
      wirings: z.optional(z.array(text)),
    }),
  ),
  /** Field prior as a weight; the edition's priors are these over their sum. Optionally per source. */
  weight: z.number().check(z.positive()),
  weightBySource: z.optional(z.record(text, z.number().check(z.positive()))),
  /** How bad it is to be wrong about it: 0 sound, 1 nuisance, 2 can burn or fail to clear, 3 metal may be live now. */
  danger: z.int().check(z.gte(0), z.lte(3)),
})

/** A finding's value in an outcome: as typed, or as a multiple of the system's nominal voltage. */
const OutcomeValue = z.union([z.string(), z.number(), z.strictObject({ times: z.number() })])
export const Outcome = z.strictObject({
  id,
  label: text,
  /** Representative findings: what one would type when the test ends this way. */
  findings: z.record(text, OutcomeValue),
  /** How often among outcomes of this test when nothing is known; default 1. */
  weight: z.optional(z.number().check(z.positive())),
  systems: z.optional(z.array(text)),
  wirings: z.optional(z.array(text)),
  /** Lamp picture for the fork, where one helps. */
  lamp: z.optional(z.enum(['lit', 'dim', 'dark'])),
})

export const Test = z.strictObject({
  id,
  label,
  title: text,
  /** What the ranking's fork calls the step, e.g. "Enter what the bulb does". */
  enter: text,
  findings: z.array(text).check(z.minLength(1), z.maxLength(3)),
  hazard: Hazard,
  /** Hazard when the loads plug straight into the source, if it differs. */
  hazardDirect: z.optional(Hazard),
  who: Who,
  minutes: z.number().check(z.positive()),
  /** Worth repeating in each operating mode that the source has. */
  eachMode: z.boolean(),
  outcomes: z.array(Outcome).check(z.minLength(2)),
})

export const Rule = z.strictObject({
  id,
  when: Condition,
  /** Cause → bits of evidence, −5 … 5: odds halved or doubled that many times. */
  says: z.record(text, z.int().check(z.gte(-5), z.lte(5))),
  /** Bits for every cause that `says` does not name; default 0. */
  others: z.optional(z.int().check(z.gte(-5), z.lte(5))),
  because: text,
  source: text,
})
export const Group = z.strictObject({ id, title: text, rules: z.array(Rule).check(z.minLength(1)) })

/** The words of one stop: what to do now, before any ranking. */
export const StopWords = z.strictObject({
  id,
  title: text,
  /** Numbered, what to do first first. */
  now: z.array(text).check(z.minLength(1)),
  why: text,
})

/** A named edge that derived facts use. */
export const Edge = z.strictObject({ id, value: z.number(), unit: text, because: text })

export const DiagnosisFile = z.strictObject({
  format: z.literal(1),
  /** Version of the derived facts' code that the rules were written for. */
  facts: z.literal(1),
  sources: z.array(
    z.strictObject({
      id: text,
      label: text,
      /** What a homeowner calls it. */
      kind: text,
      modes: z.array(text).check(z.minLength(1)),
      engine: z.boolean(),
    }),
  ),
  systems: z.array(
    z.strictObject({
      id: text,
      label: text,
      nominalVolts: z.number(),
      hertz: z.number(),
      legs: z.union([z.literal(1), z.literal(2)]),
    }),
  ),
  wirings: z.array(Named),
  modes: z.array(Named),
  places: z.array(Named),
  readings: z.array(Reading),
  observations: z.array(Observation),
  causes: z.array(Cause),
  tests: z.array(Test),
  groups: z.array(Group),
  edges: z.array(Edge),
  stops: z.array(StopWords),
})

/** How a test is done: kept apart from the ranking because some of it is for qualified people only. */
export const TestProcedure = z.strictObject({
  test: id,
  audience: Audience,
  instruments: z.array(text),
  /** What must be true before it starts; safety first. */
  before: z.array(text),
  steps: z.array(text).check(z.minLength(1)),
  shows: text,
  cannotShow: text,
  source: text,
})

export const Remedy = z.strictObject({
  hazard: Hazard,
  who: Who,
  steps: z.array(text).check(z.minLength(1)),
  /** Installs a neutral-to-ground bond: shown only when the bond gate has released it. */
  installsBond: z.optional(z.boolean()),
})
export const CauseProcedure = z.strictObject({
  cause: id,
  audience: Audience,
  /** One or two plain sentences: what it is. */
  means: z.optional(text),
  danger: z.optional(z.strictObject({ level: z.enum(['danger', 'warning', 'caution', 'notice']), text })),
  /** Homeowner's words: "fits" and "may", never a percentage; and what may be done with nothing opened. */
  homeowner: z.optional(z.strictObject({ fits: text, doNow: z.array(text) })),
  lookAlikes: z.optional(z.array(z.strictObject({ cause: id, test: id, how: text }))),
  remedies: z.array(Remedy),
  /** What proves the repair; `modes` says in which operating modes it must pass. */
  proof: z.optional(
    z.array(z.strictObject({ test: id, modes: z.enum(['every', 'where-found']), expect: text })),
  ),
})
export const ProceduresFile = z.strictObject({
  format: z.literal(1),
  audience: Audience,
  tests: z.array(TestProcedure),
  causes: z.array(CauseProcedure),
})

const day = z.string().check(z.regex(/^\d{4}-\d{2}-\d{2}$/, 'must be a date: year-month-day'))
export const ArticleHead = z.strictObject({
  slug: id,
  title: text,
  audience: Audience,
  causes: z.array(id),
  tests: z.array(id),
  /** Words people search for, symptoms first. */
  words: z.array(text),
  sources: z.array(text).check(z.minLength(1)),
  /** Date, year-month-day. */
  reviewed: day,
  /** When somebody is to look at it again. */
  dueForReview: z.optional(day),
  /** Since when it holds no more: still readable by its link, found and suggested nowhere. */
  withdrawn: z.optional(day),
  /** The article to read instead. */
  replacedBy: z.optional(id),
})
export const Article = z.extend(ArticleHead, { body: text })
export const ArticlesFile = z.strictObject({
  format: z.literal(1),
  audience: Audience,
  articles: z.array(Article),
})

export type Hazard = z.infer<typeof Hazard>
export type Who = z.infer<typeof Who>
export type Reading = z.infer<typeof Reading>
export type Observation = z.infer<typeof Observation>
export type Cause = z.infer<typeof Cause>
export type Test = z.infer<typeof Test>
export type Outcome = z.infer<typeof Outcome>
export type StopWords = z.infer<typeof StopWords>
export type Rule = z.infer<typeof Rule>
export type Group = z.infer<typeof Group>
export type DiagnosisFile = z.infer<typeof DiagnosisFile>
export type TestProcedure = z.infer<typeof TestProcedure>
export type Remedy = z.infer<typeof Remedy>
export type CauseProcedure = z.infer<typeof CauseProcedure>
export type ProceduresFile = z.infer<typeof ProceduresFile>
export type Article = z.infer<typeof Article>
export type ArticlesFile = z.infer<typeof ArticlesFile>
