import type { z } from 'zod'
import type { MessageId } from '../../../../shared/messages/en.ts'

/** What a letter says, in words of its language; how it is laid out is the same for all. */
export interface LetterText {
  /** The fact first: "Long Bank: keep out until Tue 18:00". */
  subject: string
  paragraphs: string[]
  /** Facts by their names, one under the other. */
  rows?: { label: string; value: string }[]
  /** The one thing to do; its path begins with a slash and hangs on the public address. */
  action?: { label: string; path: string }
  /** Under the action: until when it works, what to do if one never asked. */
  closing?: string[]
}

/** Words of the letter's language; see `renderMessage` for what happens to params. `{address}` is where the register is reached. */
export type Say = (id: MessageId, params?: Record<string, string | number>) => string

/** One kind of letter. `params` is all it may say; `secrets` names those that are blanked once it is out, or given up. */
export interface LetterKind<Params extends z.ZodObject> {
  params: Params
  secrets: readonly (keyof z.output<Params> & string)[]
  write(params: z.output<Params>, say: Say): LetterText
}

/** Lets a kind's `write` know its params. */
export const defineLetter = <Params extends z.ZodObject>(kind: LetterKind<Params>): LetterKind<Params> => kind
