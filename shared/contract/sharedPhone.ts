import { z } from 'zod'
import { idSchema } from './common.ts'
import { pinSchema } from './person.ts'
import { passwordSchema } from './session.ts'
import { lineText } from './text.ts'

/** Makes the phone that asks one of the farm's: it keeps a secret from then on. */
export const enrolPhoneSchema = z.strictObject({ id: idSchema, name: lineText(60), password: passwordSchema })
export type EnrolPhone = z.infer<typeof enrolPhoneSchema>

export const sharedPhoneSchema = z.object({
  id: z.string(),
  name: z.string(),
  enrolledBy: z.string(),
  enrolledAt: z.string(),
  lastUsedAt: z.string().nullable(),
  revokedAt: z.string().nullable(),
})
export type SharedPhone = z.infer<typeof sharedPhoneSchema>
export const sharedPhonesSchema = z.object({ items: z.array(sharedPhoneSchema), next: z.null() })

/** Whose phone this is, and who may sign in on it by PIN; null on any other. */
export const phoneHereSchema = z.object({
  phone: z.object({ name: z.string(), farmName: z.string(), people: z.array(z.object({ id: z.string(), name: z.string() })) }).nullable(),
})
export type PhoneHere = z.infer<typeof phoneHereSchema>

export const pinSignInSchema = z.strictObject({ personId: idSchema, pin: pinSchema })
