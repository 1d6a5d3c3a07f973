import { first } from './en/first.ts'
import { later } from './en/later.ts'
import { mail } from './en/mail.ts'
import { mapPrint } from './en/mapPrint.ts'
import { pdf } from './en/pdf.ts'
import { registerPrint } from './en/registerPrint.ts'
import { seasonPrint } from './en/seasonPrint.ts'

/** What the screens say, in English; `{name}` stands for a parameter. The client reads this alone, in two parts. */
const screens = { ...first, ...later, problems: { ...first.problems, ...later.problems } }

/** Every word a person reads, in English: the screens, and what is printed. The shape of every other language. */
export const en = { ...screens, mail, mapPrint, pdf, registerPrint, seasonPrint }

/** The same tree with any words in its leaves. */
export type WordsLike<Tree> = { [Key in keyof Tree]: Tree[Key] extends string ? string : WordsLike<Tree[Key]> }
export type FirstScreens = WordsLike<typeof first>
export type LaterScreens = WordsLike<typeof later>
export type Screens = WordsLike<typeof screens>
export type Messages = WordsLike<typeof en>

type Path<Tree> = {
  [Key in keyof Tree & string]: Tree[Key] extends string ? Key : `${Key}.${Path<Tree[Key]>}`
}[keyof Tree & string]
/** The dotted name of one message. */
export type MessageId = Path<typeof en>
