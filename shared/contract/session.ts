import { z } from 'zod'
import { preferencesSchema } from './preferences.ts'

export const ROLES = ['owner', 'manager', 'applicator', 'certifier'] as const
export const roleSchema = z.enum(ROLES)
export type Role = z.infer<typeof roleSchema>

/** Passwords are taken as typed: no trimming, no folding, at most 256 units so that hashing is bounded. */
export const passwordSchema = z.string().min(1, { error: 'text.required' }).max(256, { error: 'text.too_long' })

export const signInSchema = z.strictObject({
  email: z.string().trim().min(3, { error: 'text.required' }).max(254, { error: 'text.too_long' }),
  password: passwordSchema,
  /** Of the second factor, where the account has one: the first answer without it is `session.code_needed`. */
  code: z.string().min(1, { error: 'text.required' }).max(60, { error: 'text.too_long' }).optional(),
})

export const membershipSchema = z.object({
  farmId: z.string(),
  farmName: z.string(),
  role: roleSchema,
  personId: z.string().nullable(),
  /** Seasons a certifier may read; null for the farm's own people. */
  seasons: z.array(z.number().int()).nullable(),
  /** The farm asks a second factor of this role, and the account has none: it opens once there is one. */
  factorNeeded: z.boolean(),
})

export const sessionSchema = z.object({
  user: z.object({
    id: z.string(),
    /** Null for who has a PIN. */
    email: z.string().nullable(),
    name: z.string(),
    language: z.enum(['en', 'es']),
    /** What is asked when something is signed. */
    signsWith: z.enum(['password', 'pin']),
    hasFactor: z.boolean(),
    preferences: preferencesSchema,
    revision: z.number().int(),
  }),
  memberships: z.array(membershipSchema),
  /** No farm is open, and seasons of one were: a certifier whose last grant ended. */
  hadGrants: z.boolean().optional(),
})
export type Session = z.infer<typeof sessionSchema>
export type Membership = z.infer<typeof membershipSchema>
