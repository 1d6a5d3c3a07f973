import type { Messages, Screens } from './en.ts'
import { blocks } from './es/blocks.ts'
import { checks } from './es/checks.ts'
import { common } from './es/common.ts'
import { farm } from './es/farm.ts'
import { files } from './es/files.ts'
import { frame } from './es/frame.ts'
import { ground } from './es/ground.ts'
import { growing } from './es/growing.ts'
import { importing } from './es/importing.ts'
import { inputs } from './es/inputs.ts'
import { journal } from './es/journal.ts'
import { mail } from './es/mail.ts'
import { mapPrint } from './es/mapPrint.ts'
import { pdf } from './es/pdf.ts'
import { problems } from './es/problems.ts'
import { profile } from './es/profile.ts'
import { recordForm } from './es/recordForm.ts'
import { records } from './es/records.ts'
import { register } from './es/register.ts'
import { registerPrint } from './es/registerPrint.ts'
import { seasonPrint } from './es/seasonPrint.ts'
import { session } from './es/session.ts'
import { shapes } from './es/shapes.ts'
import { sprayers } from './es/sprayers.ts'
import { start } from './es/start.ts'
import { today } from './es/today.ts'
import { units } from './es/units.ts'
import { versions } from './es/versions.ts'


/** What the screens say, in Spanish. A missing key does not compile. */
export const screens: Screens = {
  blocks, checks, common, farm, files, frame, ground, growing, importing, inputs, journal, problems, profile, recordForm, records, register, session, shapes, sprayers, start, today, units, versions,
}

/** Every word a person reads, in Spanish. */
export const es: Messages = { ...screens, mail, mapPrint, pdf, registerPrint, seasonPrint }
