import { fileTypeFromBuffer } from 'file-type'
import { FILE_TYPES, type FileKind, type FileType } from '../../../shared/contract/attachment.ts'
import { AppError, invalid } from '../../errors.ts'

/** A file as it came in a multipart request; what it says of itself is not believed. */
export interface UploadedFile {
  /** The client's own name for it, empty where it gave none. */
  name: string
  /** The type the client announced. */
  announced: string
  bytes: Buffer
}

/** Endings and announced types that go with what the bytes are. */
const SAID: Record<FileType, { endings: string[]; announced: string[] }> = {
  'image/jpeg': { endings: ['jpg', 'jpeg', 'jpe', 'jfif'], announced: ['image/jpeg', 'image/jpg', 'image/pjpeg'] },
  'image/png': { endings: ['png'], announced: ['image/png'] },
  'image/webp': { endings: ['webp'], announced: ['image/webp'] },
  'application/pdf': { endings: ['pdf'], announced: ['application/pdf'] },
}
const NOTHING_ANNOUNCED = ['', 'application/octet-stream']
const CAMERA_ONLY = ['image/heic', 'image/heif', 'image/heic-sequence', 'image/heif-sequence', 'image/avif', 'image/tiff', 'image/x-canon-cr2', 'image/x-canon-cr3', 'image/x-nikon-nef', 'image/x-sony-arw', 'image/x-adobe-dng', 'image/x-fujifilm-raf', 'image/x-olympus-orf', 'image/x-panasonic-rw2']

/**
 * What a file is, by its bytes; its name and its announced type must not say otherwise.
 * @throws {AppError} invalid-input for an empty file, wrong-type for all that is no JPEG, PNG, WebP or, as a paper, PDF.
 */
export async function judgeFile({ name, announced, bytes }: UploadedFile, kind: FileKind): Promise<FileType> {
  if (bytes.length === 0) throw invalid([{ path: 'file', code: 'file.empty' }])
  const found = (await fileTypeFromBuffer(bytes))?.mime
  if (found !== undefined && CAMERA_ONLY.includes(found)) throw refuse('file.camera_only')
  const type = FILE_TYPES.find((known) => known === found)
  if (type === undefined) throw refuse('file.type')
  const ending = /\.([A-Za-z0-9]{1,8})$/.exec(name.trim())?.[1]?.toLowerCase()
  const said = SAID[type]
  if (ending !== undefined && !said.endings.includes(ending)) throw refuse('file.name_differs')
  if (![...NOTHING_ANNOUNCED, ...said.announced].includes(announced.toLowerCase())) throw refuse('file.name_differs')
  if (kind === 'photo' && type === 'application/pdf') throw refuse('file.photo_type')
  return type
}

const refuse = (code: string) => new AppError('wrong-type', code, { errors: [{ path: 'file', code }] })
