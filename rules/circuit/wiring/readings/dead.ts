import { ohmsBetween } from '../../instruments/ohmmeter.ts'
import { hasPanel } from '../context.ts'
import type { Found, Measured } from './measured.ts'

/** Ohms, each with what is lifted for it. */
export function deadOhms(m: Measured): Found {
  const all = m.dead()
  const found: Found = {
    'receptacle.ng.ohms': ohmsBetween(all, 'receptacle.neutral', 'receptacle.ground'),
    'receptacle.hg.ohms': ohmsBetween(all, 'receptacle.hot', 'receptacle.ground'),
    'source.ng.ohms': ohmsBetween(m.deadSource(), 'source.neutral', 'source.case'),
  }
  if (hasPanel(m.context)) {
    const panel = m.deadPanel()
    found['panel.ng.ohms'] = ohmsBetween(panel, 'panel.neutral', 'panel.ground')
    found['branch.egc.ohms'] = ohmsBetween(panel, 'panel.ground', 'receptacle.ground')
  }
  return found
}
