import { existsSync } from 'node:fs'
import { installPackage } from './debian.mjs'

/** Sees to it that the simulator is there which the tests hold the circuit model against. */
export async function needNgspice() {
  if (!existsSync('/usr/bin/ngspice')) await installPackage('ngspice', 'ngspice (for the tests)')
}
