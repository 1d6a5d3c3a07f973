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
