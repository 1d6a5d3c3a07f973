import { z } from 'zod'
import { attachmentSchema } from './attachment.ts'
import { civilDateSchema, idSchema, revisionSchema } from './common.ts'
import { passwordSchema, roleSchema } from './session.ts'
import { lineText } from './text.ts'

/** Roles that a person of the farm may have. */
export const personRoleSchema = z.enum(['owner', 'manager', 'applicator'])

export const personSchema = z.object({
  id: z.string(),
  name: z.string(),
  role: roleSchema,
  email: z.string().nullable(),
  active: z.boolean(),
  /** What the person signs with; null for who cannot sign in. */
  signsWith: z.enum(['password', 'pin']).nullable(),
  /** Whether a second factor guards the account. */
  hasFactor: z.boolean(),
  revision: z.number().int(),
})
export type Person = z.infer<typeof personSchema>

/** Six figures; which of them anybody would try first is said by `isTrivialPin`. */
export const pinSchema = z.string().regex(/^\d{6}$/, { error: 'pin.format' })

/** Somebody without e-mail; the password is the owner's own. */
export const addPersonSchema = z.strictObject({ id: idSchema, name: lineText(120), pin: pinSchema.nullable().default(null), password: passwordSchema })
export type AddPerson = z.infer<typeof addPersonSchema>

export const changePersonSchema = z.strictObject({
  revision: revisionSchema,
  name: lineText(120).optional(),
  role: personRoleSchema.optional(),
  active: z.boolean().optional(),
  password: passwordSchema,
})
export type ChangePerson = z.infer<typeof changePersonSchema>

export const setPinSchema = z.strictObject({ revision: revisionSchema, pin: pinSchema, password: passwordSchema })
export type SetPin = z.infer<typeof setPinSchema>

/** A deed about a person that asks for the owner's password and nothing else. */
export const proveOwnerSchema = z.strictObject({ password: passwordSchema })

/** Whether owner, manager and certifier need a second factor. */
export const factorAskedSchema = z.object({ asked: z.boolean() })
export const askFactorSchema = z.strictObject({ asked: z.boolean(), password: passwordSchema })

export const PAPER_KINDS = ['training', 'licence'] as const
const paperFields = {
  kind: z.enum(PAPER_KINDS),
  title: lineText(120),
  number: lineText(60).nullable().default(null),
  issuedOn: civilDateSchema.nullable().default(null),
  /** Last day it holds. */
  expiresOn: civilDateSchema.nullable().default(null),
}
export const addPaperSchema = z.strictObject({ id: idSchema, personId: idSchema, ...paperFields })
export type AddPaper = z.infer<typeof addPaperSchema>
export const changePaperSchema = z.strictObject({
  revision: revisionSchema, ...paperFields,
  /** Takes it out of the list; what stood in it stays. */
  ended: z.boolean().default(false),
})
export type ChangePaper = z.infer<typeof changePaperSchema>

export const personPaperSchema = z.object({
  id: z.string(),
  person: z.object({ id: z.string(), name: z.string() }),
  kind: z.enum(PAPER_KINDS),
  title: z.string(),
  number: z.string().nullable(),
  issuedOn: z.string().nullable(),
  expiresOn: z.string().nullable(),
  files: z.array(attachmentSchema),
  revision: z.number().int(),
})
export type PersonPaper = z.infer<typeof personPaperSchema>

/** Papers of one person, or those that run out until a day, of who is active. */
export const paperQuerySchema = z.strictObject({ person: idSchema.optional(), expiresUntil: civilDateSchema.optional() })
export const personPapersSchema = z.object({ items: z.array(personPaperSchema), next: z.null() })
