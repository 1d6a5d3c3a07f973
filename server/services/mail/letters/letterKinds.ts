import type { z } from 'zod'
import { factorChanged } from './factorChanged.ts'
import { grant } from './grant.ts'
import { invitation } from './invitation.ts'
import { jobsDue } from './jobsDue.ts'
import { passwordChanged } from './passwordChanged.ts'
import { passwordReset } from './passwordReset.ts'
import { signIn } from './signIn.ts'

/** Every kind of letter, by the name under which it stands in the outbox. */
export const LETTER_KINDS = { factorChanged, grant, invitation, jobsDue, passwordChanged, passwordReset, signIn }

export type LetterName = keyof typeof LETTER_KINDS

/** A kind of letter and what it says. */
export type LetterContent = { [Name in LetterName]: { kind: Name; params: z.input<(typeof LETTER_KINDS)[Name]['params']> } }[LetterName]

/** Whether a letter of this name is still known; older ones may lie in the outbox. */
export const isLetterName = (name: string): name is LetterName => Object.hasOwn(LETTER_KINDS, name)
