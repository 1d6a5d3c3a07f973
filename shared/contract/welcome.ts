import { z } from 'zod'
import { INVITED_ROLES } from './invitation.ts'
import { passwordSchema } from './session.ts'
import { lineText } from './text.ts'

const tokenSchema = z.string().min(1, { error: 'text.required' }).max(80)

export const linkParamsSchema = z.strictObject({ token: z.string().max(80) })

/** Whom a one-time link is for, and what it opens. */
export const welcomeSchema = z.object({
  email: z.string(),
  /** Whether a name and password are taken with it; otherwise one signs in and takes it. */
  needsPassword: z.boolean(),
  invitation: z.object({
    farmId: z.string(), farm: z.string(), by: z.string(), role: z.enum(INVITED_ROLES), language: z.enum(['en', 'es']), name: z.string().nullable(),
  }).nullable(),
  /** What a certifier without an account was let in to read. */
  grant: z.object({ farm: z.string(), seasons: z.array(z.number().int()), endsOn: z.string() }).nullable(),
})
export type Welcome = z.infer<typeof welcomeSchema>

export const acceptWelcomeSchema = z.strictObject({ token: tokenSchema, name: lineText(120), password: passwordSchema })
export const acceptSignedInSchema = z.strictObject({ token: tokenSchema })
export const spendResetSchema = z.strictObject({ token: tokenSchema, password: passwordSchema })
