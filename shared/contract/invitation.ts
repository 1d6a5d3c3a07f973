import { z } from 'zod'
import { idSchema, revisionSchema } from './common.ts'
import { emailSchema } from './email.ts'
import { passwordSchema } from './session.ts'
import { lineText } from './text.ts'

/** What somebody can be invited as; a certifier gets a grant. */
export const INVITED_ROLES = ['owner', 'manager', 'applicator'] as const

export const createInvitationSchema = z.strictObject({
  id: idSchema,
  email: emailSchema,
  /** What the letter calls them; they choose their own name. */
  name: lineText(120).nullable().default(null),
  role: z.enum(INVITED_ROLES),
  /** Of the letter, and of a new account. */
  language: z.enum(['en', 'es']),
  /** The inviter's, asked for where the role leads the farm. */
  password: passwordSchema.optional(),
})
export type CreateInvitation = z.output<typeof createInvitationSchema>

export const onInvitationSchema = z.strictObject({ revision: revisionSchema })

export const invitationSchema = z.object({
  id: z.string(),
  email: z.string(),
  name: z.string().nullable(),
  role: z.enum(INVITED_ROLES),
  language: z.enum(['en', 'es']),
  invitedBy: z.string(),
  sentAt: z.string(),
  expiresAt: z.string(),
  /** Its link works no more. */
  isLate: z.boolean(),
  /** How far its last letter has got; `failing`: tried in vain so far. */
  letter: z.enum(['waiting', 'failing', 'sent', 'dead']).nullable(),
  revision: z.number().int(),
})
export type Invitation = z.infer<typeof invitationSchema>
