import type { WorksheetName } from '../../../rules/worksheets/worksheets.ts'
import { form as faultClearing } from './fault-clearing.form.ts'
import { form as ghostOrFirm } from './ghost-or-firm.form.ts'
import { form as groundingSizes } from './grounding-sizes.form.ts'
import { form as groundRod } from './ground-rod.form.ts'
import { form as lostNeutral } from './lost-neutral.form.ts'
import type { Form } from './parts.ts'
import { form as tripTime } from './trip-time.form.ts'
import { form as voltageDrop } from './voltage-drop.form.ts'

export const forms: Readonly<Record<WorksheetName, Form>> = {
  'fault-clearing': faultClearing,
  'ground-rod': groundRod,
  'voltage-drop': voltageDrop,
  'lost-neutral': lostNeutral,
  'trip-time': tripTime,
  'ghost-or-firm': ghostOrFirm,
  'grounding-sizes': groundingSizes,
}
