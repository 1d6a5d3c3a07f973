import type { FirstScreens } from '../en.ts'
import { checks } from './checks.ts'
import { common } from './common.ts'
import { fieldProblems } from './fieldProblems.ts'
import { frame } from './frame.ts'
import { inputs } from './inputs.ts'
import { pin } from './pin.ts'
import { recordForm } from './recordForm.ts'
import { records } from './records.ts'
import { register } from './register.ts'
import { session } from './session.ts'
import { today } from './today.ts'
import { units } from './units.ts'

/** What a phone needs from signing in over Today to a new record, in Spanish. A missing key does not compile. */
export const first: FirstScreens = { checks, common, frame, inputs, pin, problems: fieldProblems, recordForm, records, register, session, today, units }
