import { fileTypeFromBuffer } from 'file-type'
import type { FileKind, FileType } from '../../../shared/contract/attachment.ts'
import { judgeFileType } from '../../../shared/files/judgeFileType.ts'
import { AppError, invalid } from '../../errors.ts'

/** A file as it came in a multipart request; what it says of itself is not believed. */
export interface UploadedFile {
  /** The client's own name for it, empty where it gave none. */
  name: string
  /** The type the client announced. */
  announced: string
  bytes: Buffer
}

/**
 * What a file is, by its bytes; its name and its announced type must not say otherwise.
 * @throws {AppError} invalid-input for an empty file, wrong-type for all that is no JPEG, PNG, WebP or, as a paper, PDF.
 */
export async function judgeFile({ name, announced, bytes }: UploadedFile, kind: FileKind): Promise<FileType> {
  const found = (await fileTypeFromBuffer(bytes))?.mime
  const judged = judgeFileType({ name, announced, bytes: bytes.length, found }, kind)
  if (judged.ok) return judged.type
  const faults = [{ path: 'file', code: `file.${judged.fault}` }]
  throw judged.fault === 'empty' ? invalid(faults) : new AppError('wrong-type', `file.${judged.fault}`, { errors: faults })
}
