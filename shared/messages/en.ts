import { blocks } from './en/blocks.ts'
import { checks } from './en/checks.ts'
import { common } from './en/common.ts'
import { farm } from './en/farm.ts'
import { files } from './en/files.ts'
import { frame } from './en/frame.ts'
import { ground } from './en/ground.ts'
import { growing } from './en/growing.ts'
import { importing } from './en/importing.ts'
import { inputs } from './en/inputs.ts'
import { journal } from './en/journal.ts'
import { mail } from './en/mail.ts'
import { mapPrint } from './en/mapPrint.ts'
import { pdf } from './en/pdf.ts'
import { problems } from './en/problems.ts'
import { profile } from './en/profile.ts'
import { recordForm } from './en/recordForm.ts'
import { records } from './en/records.ts'
import { register } from './en/register.ts'
import { registerPrint } from './en/registerPrint.ts'
import { seasonPrint } from './en/seasonPrint.ts'
import { session } from './en/session.ts'
import { shapes } from './en/shapes.ts'
import { sprayers } from './en/sprayers.ts'
import { start } from './en/start.ts'
import { today } from './en/today.ts'
import { units } from './en/units.ts'
import { versions } from './en/versions.ts'

/** What the screens say, in English; `{name}` stands for a parameter. The client reads this alone. */
export const screens = {
  blocks, checks, common, farm, files, frame, ground, growing, importing, inputs, journal, problems, profile, recordForm, records, register, session, shapes, sprayers, start, today, units, versions,
}

/** Every word a person reads, in English: the screens, what is printed and what is mailed. The shape of every other language. */
export const en = { ...screens, mail, mapPrint, pdf, registerPrint, seasonPrint }

/** The same tree with any words in its leaves. */
export type WordsLike<Tree> = { [Key in keyof Tree]: Tree[Key] extends string ? string : WordsLike<Tree[Key]> }
export type Screens = WordsLike<typeof screens>
export type Messages = WordsLike<typeof en>

type Path<Tree> = {
  [Key in keyof Tree & string]: Tree[Key] extends string ? Key : `${Key}.${Path<Tree[Key]>}`
}[keyof Tree & string]
/** The dotted name of one message. */
export type MessageId = Path<typeof en>
