import type { Messages } from './en.ts'
import { blocks } from './es/blocks.ts'
import { checks } from './es/checks.ts'
import { common } from './es/common.ts'
import { farm } from './es/farm.ts'
import { frame } from './es/frame.ts'
import { inputs } from './es/inputs.ts'
import { pdf } from './es/pdf.ts'
import { problems } from './es/problems.ts'
import { records } from './es/records.ts'
import { register } from './es/register.ts'
import { session } from './es/session.ts'
import { today } from './es/today.ts'
import { units } from './es/units.ts'



/** Every word a person reads, in Spanish. A missing key does not compile. */
export const es: Messages = {
  blocks, checks, common, farm, frame, inputs, pdf, problems, records, register, session, today, units,
}
