import { z } from 'zod'

export const ROLES = ['owner', 'manager', 'applicator', 'certifier'] as const
export const roleSchema = z.enum(ROLES)
export type Role = z.infer<typeof roleSchema>

/** Passwords are taken as typed: no trimming, no folding, at most 256 units so that hashing is bounded. */
export const passwordSchema = z.string().min(1, { error: 'text.required' }).max(256, { error: 'text.too_long' })

export const signInSchema = z.strictObject({
  email: z.string().trim().min(3, { error: 'text.required' }).max(254, { error: 'text.too_long' }),
  password: passwordSchema,
})

export const membershipSchema = z.object({
  farmId: z.string(),
  farmName: z.string(),
  role: roleSchema,
  personId: z.string().nullable(),
  /** Seasons a certifier may read; null for the farm's own people. */
  seasons: z.array(z.number().int()).nullable(),
})

export const sessionSchema = z.object({
  user: z.object({ id: z.string(), email: z.string(), name: z.string(), language: z.enum(['en', 'es']) }),
  memberships: z.array(membershipSchema),
})
export type Session = z.infer<typeof sessionSchema>
export type Membership = z.infer<typeof membershipSchema>
