import type { Units } from '../wire.ts'

/** NEC's advice, per cent: one branch or feeder, and all of it to the farthest outlet. */
const nec = { each: 3, all: 5 } as const
/** IEC 60364-5-52 table G.52.1 on the public network, per cent: lighting, and other uses. */
const iec = { light: 3, other: 5 } as const

/**
 * Whether the drop is within what is advised; neither code forbids more.
 * @param percent in all
 * @param worst of any one run, per cent
 */
export function adviceOn(
  units: Units,
  percent: number,
  worst: number,
  runs: number,
): { kept: boolean; sentence: string } {
  if (units === 'metric')
    return {
      kept: percent <= iec.light,
      sentence:
        percent <= iec.light
          ? 'That is within the 3 % that IEC 60364-5-52 gives lighting on the public network.'
          : `IEC 60364-5-52 gives 3 % for lighting and 5 % for other uses on the public network, 6 and 8 % on a private supply. This is over the ${percent <= iec.other ? 'first' : 'first two'}.`,
    }
  if (percent <= nec.all && worst <= nec.each)
    return {
      kept: true,
      sentence:
        runs === 1
          ? 'That is within the 3 % the NEC recommends for one branch circuit or feeder.'
          : 'That is within what the NEC recommends: 3 % for each, 5 % in all.',
    }
  return {
    kept: false,
    sentence:
      percent > nec.all
        ? 'The NEC recommends no more than 5 % to the farthest outlet, and 3 % in any one branch circuit or feeder.'
        : 'The NEC recommends no more than 3 % in one branch circuit or feeder.',
  }
}
