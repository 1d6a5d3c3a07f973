import { z } from 'zod'
import { idSchema } from './common.ts'

/** A photo shows the work or the place; a paper is a label, a receipt, a certificate: a PDF or a picture of it. */
export const FILE_KINDS = ['photo', 'paper'] as const
export type FileKind = (typeof FILE_KINDS)[number]

/** What is taken in, judged by its bytes. */
export const FILE_TYPES = ['image/jpeg', 'image/png', 'image/webp', 'application/pdf'] as const
export type FileType = (typeof FILE_TYPES)[number]

/** Largest file, bytes. */
export const MOST_FILE_BYTES = 10 * 1024 * 1024
/** Most photos and papers of one record. */
export const MOST_FILES = 20

/** The fields beside the file itself in a multipart request; the label is read off the file's name. */
export const addFileSchema = z.strictObject({ id: idSchema, kind: z.enum(FILE_KINDS) })
export type AddFile = z.infer<typeof addFileSchema>

/** A photo or paper of a record. */
export const attachmentSchema = z.object({
  id: z.string(),
  recordId: z.string(),
  kind: z.enum(FILE_KINDS),
  label: z.string(),
  type: z.enum(FILE_TYPES),
  bytes: z.number().int(),
  /** SHA-256 of the file as it was sent, hex. */
  digest: z.string(),
  /** The picture as it is shown: without what the camera wrote into it; null for a PDF. */
  served: z.object({ bytes: z.number().int(), digest: z.string(), width: z.number().int(), height: z.number().int() }).nullable(),
  /** As the camera's clock said; null where it said nothing. */
  takenAt: z.string().nullable(),
  uploadedBy: z.object({ id: z.string(), name: z.string() }),
  uploadedAt: z.string(),
  /** First signed version that names it; null while none does. */
  signedVersion: z.number().int().nullable(),
  removedAt: z.string().nullable(),
})
export type Attachment = z.infer<typeof attachmentSchema>

export const fileQuerySchema = z.strictObject({
  /** The file as it was sent, with all that the camera wrote into it. */
  original: z.literal('1').optional(),
  /** A small picture for a list. */
  size: z.literal('small').optional(),
})
export type FileQuery = z.infer<typeof fileQuerySchema>
