import { z } from 'zod'
import { idSchema, revisionSchema } from './common.ts'
import { preferencesSchema } from './preferences.ts'
import { passwordSchema } from './session.ts'
import { lineText } from './text.ts'

/** What a person changes of their own; what is not sent stays. */
export const changeMeSchema = z.strictObject({
  revision: revisionSchema,
  name: lineText(120).optional(),
  language: z.enum(['en', 'es']).optional(),
  /** Each preference that is sent replaces the one that stands. */
  preferences: preferencesSchema.optional(),
})
export type ChangeMe = z.infer<typeof changeMeSchema>

export const changePasswordSchema = z.strictObject({ password: passwordSchema, newPassword: passwordSchema })

/** A session of one's own as it is shown: the secret that opens it stays in the cookie. */
export const ownSessionSchema = z.object({
  id: z.string(),
  /** Browser and system, as the browser names them: "Firefox, Android". */
  device: z.string().nullable(),
  /** Whether it was opened by PIN on a phone of a farm. */
  onSharedPhone: z.boolean(),
  openedAt: z.string(),
  /** Right to a minute. */
  seenAt: z.string(),
  /** If it is not used again. */
  endsAt: z.string(),
  /** The one that asks. */
  isThis: z.boolean(),
})
export type OwnSession = z.infer<typeof ownSessionSchema>
export const ownSessionsSchema = z.object({ items: z.array(ownSessionSchema), next: z.null() })

export const sessionParamsSchema = z.strictObject({ id: idSchema })

/** A code of the second factor, or a recovery code in its place; spaces and dashes do not matter. */
export const codeSchema = z.string().min(1, { error: 'text.required' }).max(60, { error: 'text.too_long' })

export const beginFactorSchema = z.strictObject({ password: passwordSchema, code: codeSchema.optional() })
/** What an authenticator takes: by its camera, or typed. */
export const factorOfferSchema = z.object({
  /** Base32, as it is typed. */
  secret: z.string(),
  /** A QR code of the `otpauth:` address: a picture as a `data:` address. */
  picture: z.string(),
})
export type FactorOffer = z.infer<typeof factorOfferSchema>
export const confirmFactorSchema = z.strictObject({ code: codeSchema })
/** Shown once, kept as digests. */
export const recoveryCodesSchema = z.object({ codes: z.array(z.string()) })
export const proveFactorSchema = z.strictObject({ password: passwordSchema, code: codeSchema })

/** How things stand with one's own second factor. */
export const factorStateSchema = z.object({ since: z.string().nullable(), codesLeft: z.number().int() })
export type FactorState = z.infer<typeof factorStateSchema>
