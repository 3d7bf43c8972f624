import { clampReads } from '../../instruments/clamp.ts'
import { magnitude } from '../../network.ts'
import { overLimitOhms } from '../../../findings/sheet.ts'
import { hasPanel, nominalVolts } from '../context.ts'
import type { Found, Measured } from './measured.ts'

/** A clamp for milliamps, round two wires at once. */
const leakageFloorAmps = 0.0005
/** A loop tester's range ends here. */
const mostLoopOhms = 2000

/** What a clamp shows; on quiet evenings the known load is started first. */
export function amps({ context, p, names, running, loaded }: Measured, found: Found): void {
  const quiet = p.houseAmps + p.houseAmpsOther < 2
  const normal = quiet ? loaded : running
  const rod = ['panel.rod', 'source.rod'].find((name) => names.has(name))
  if (rod !== undefined) found['rod.amps'] = clampReads(normal, [rod])
  if (!hasPanel(context)) return
  if (names.has('feeder.ground')) found['feeder.egc.amps'] = clampReads(normal, ['feeder.ground'])
  found['branch.egc.amps'] = clampReads(loaded, ['branch.ground'])
  found['branch.hot.amps'] = clampReads(loaded, ['branch.hot'])
  found['branch.neutral.amps'] = clampReads(loaded, ['branch.neutral'])
  found['branch.leakage.milliamps'] =
    1000 * clampReads(loaded, ['branch.hot', 'branch.neutral'], leakageFloorAmps)
}

/** A loop tester, hot to ground; it takes nothing where there is no voltage. */
export function loopOhms({ context, running }: Measured, found: Found): void {
  const { open, impedance } = running.port('receptacle.hot', 'receptacle.ground')
  if (magnitude(open) < 0.5 * nominalVolts(context)) return
  const ohms = magnitude(impedance)
  found['receptacle.loop.ohms'] = ohms > mostLoopOhms ? overLimitOhms : ohms
}
