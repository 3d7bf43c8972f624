/**
 * What the loop picture shows: source, panel and receptacle, every conductor with its current, the bonds, the rods,
 * and which metal is live. Made by `loop-of.ts` from the circuit model, or by hand in a test; drawn by `lay-out.ts`
 * and said by `loop-words.ts`. Amps and volts are RMS.
 */

export type Wire = 'hot' | 'leg2' | 'neutral' | 'ground'
export type Place = 'source' | 'panel' | 'receptacle'
/** Source to panel, and the circuit from there on. Plugged straight in there is the circuit alone. */
export type Stretch = 'feeder' | 'circuit'

/** A current and which way it goes while hot pushes: away from the source, or back to it. */
export type Flow = { amps: number; toward: 'load' | 'source' }

/** One conductor along one stretch. */
export type Run = Flow & {
  stretch: Stretch
  /** The conductor it begins on at the source's end, and the terminal it ends on: different ones are crossed. */
  from: Wire
  to: Wire
  /** `absent`: nobody ever ran it. */
  state: 'whole' | 'open' | 'poor' | 'absent'
  /** Where an open one is open: along the stretch, or inside the source. */
  openAt: 'stretch' | 'source'
  /** Ohms that a poor joint or a long run adds; 0 otherwise. */
  addedOhms: number
}

/** Neutral joined to ground, on purpose or not. */
export type Tie = {
  place: Place
  /** `wanted`: the one bond. `second`: one too many. `jumper`: in the receptacle. `astray`: in what is plugged in. `middle`: case tied to half the output. */
  kind: 'wanted' | 'second' | 'jumper' | 'astray' | 'middle'
  amps: number
  toward: 'ground' | 'neutral'
}

export type Rod = { place: 'source' | 'panel'; ohms: number; amps: number; toward: 'earth' | 'metal' }

/** What runs at the panel, where its current matters. */
export type HouseLoad = { leg: 'hot' | 'leg2'; volts: number; amps: number }

/** A hot wire on metal. */
export type Touch = { place: Place; leg: 'hot' | 'leg2'; amps: number }

/**
 * Metal a person can touch. `live`: a current that can hold or kill goes through a person. `joined`: hot is on it,
 * and it waits for whoever bridges it and neutral. `faint`: volts on a meter, next to nothing through a person.
 */
export type Metal = {
  place: Place
  is: 'quiet' | 'faint' | 'live' | 'joined'
  /** Against earth; `joined`: against neutral. With a person of 1000 Ω across, unless faint. */
  volts: number
  /** Through that person, amps. */
  bodyAmps: number
}

export type Breaker = {
  /** Its rating, A. */
  amps: number
  curve: 'household' | 'b'
  sees: number
}

export type LoopState = {
  nominal: 120 | 230
  /** Placed in this order from the source on; without a panel loads plug straight into the source. */
  places: readonly Place[]
  twoLegs: boolean
  sourceLabel: string
  /** Across the source's hot and neutral. */
  sourceVolts: number
  /** An inverter or generator limits what it gives into a fault; a utility does not. */
  limited: boolean
  drawn: 'load' | 'fault'
  runs: readonly Run[]
  ties: readonly Tie[]
  /** Where the one bond would be, when it is not there. */
  bondMissing: Place | undefined
  rods: readonly Rod[]
  house: readonly HouseLoad[]
  load: { volts: number; amps: number } | undefined
  touch: Touch | undefined
  /** From hot to metal through what is plugged in. */
  leak: { ohms: number; amps: number } | undefined
  metal: readonly Metal[]
  breaker: Breaker
  /** One sentence about this cause that the picture can't say. */
  note: string | undefined
}

/** UL 943: a Class A GFCI must not trip below 4 mA, and must from 6 mA on. Less is no current worth the name. */
export const worthTheName = 0.004
export const gfciTrips = 0.006
/** A person as a resistance, Ω: IEEE 80. */
export const bodyOhms = 1000
/** From here on some people can't let go, A: IEC 60479-1, line b, from memory. */
export const letGoAmps = 0.005
/** Volts of metal that are worth a word although next to nothing flows through a person. */
export const faintVolts = 15

/** Joined at the receptacle: no bond of the system. */
export const isAtReceptacle = (tie: Tie): boolean => tie.place === 'receptacle'

/** Current goes into the ground at one rod and comes out at the other. */
export const flowsRodToRod = ({ rods }: LoopState): boolean =>
  rods.length === 2 && rods.every((rod) => rod.amps >= worthTheName) && rods[0]?.toward !== rods[1]?.toward

export const metalIsLive = ({ is }: Metal): boolean => is === 'live' || is === 'joined'
