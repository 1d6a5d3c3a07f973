import type { Messages } from './en.ts'
import { first } from './es/first.ts'
import { later } from './es/later.ts'
import { mail } from './es/mail.ts'
import { mapPrint } from './es/mapPrint.ts'
import { pdf } from './es/pdf.ts'
import { registerPrint } from './es/registerPrint.ts'
import { seasonPrint } from './es/seasonPrint.ts'

/** Every word a person reads, in Spanish. */
export const es: Messages = { ...first, ...later, problems: { ...first.problems, ...later.problems }, mail, mapPrint, pdf, registerPrint, seasonPrint }
