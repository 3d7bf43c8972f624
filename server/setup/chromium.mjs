import { existsSync } from 'node:fs'
import { installPackage } from './debian.mjs'

/** Sees to it that the browser for the tests is there. */
export async function needChromium() {
  if (!existsSync('/usr/bin/chromium')) await installPackage('chromium', 'Chromium (for the tests)')
}
