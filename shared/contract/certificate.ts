import { z } from 'zod'
import { civilDateSchema, idSchema, revisionSchema } from './common.ts'
import { lineText, noteText } from './text.ts'

/** The organic certificate as it is printed. */
const certificateFields = {
  number: lineText(60),
  /** Who certifies: the body's own name. */
  body: lineText(120),
  /** What it covers, in the certificate's words. */
  scope: noteText(500).nullable().default(null),
  /** It runs from this day, in place of the one before. */
  validFrom: civilDateSchema,
  /** Its last day; null where none is printed. */
  validUntil: civilDateSchema.nullable().default(null),
}

export const addCertificateSchema = z.strictObject({ id: idSchema, ...certificateFields })
export type AddCertificate = z.output<typeof addCertificateSchema>

/** Sent whole. */
export const changeCertificateSchema = z.strictObject({ revision: revisionSchema, ...certificateFields })
export type ChangeCertificate = z.output<typeof changeCertificateSchema>

export const withdrawCertificateSchema = z.strictObject({ reason: noteText(500) })

export const certificateSchema = z.object({
  id: z.string(),
  number: z.string(),
  body: z.string(),
  scope: z.string().nullable(),
  /** Null of those written down before it was asked. */
  validFrom: z.string().nullable(),
  validUntil: z.string().nullable(),
  withdrawn: z.object({ at: z.string(), reason: z.string() }).nullable(),
  revision: z.number().int(),
})
export type Certificate = z.infer<typeof certificateSchema>
