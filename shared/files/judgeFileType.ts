import { FILE_TYPES, type FileKind, type FileType } from '../contract/attachment.ts'

/** A file as it was chosen or sent; what it says of itself is not believed. */
export interface SeenFile {
  /** Its own name, empty where it has none. */
  name: string
  /** The type that it announces, empty for none. */
  announced: string
  /** Its length, bytes. */
  bytes: number
  /** The media type that its bytes show; undefined where they show none. */
  found: string | undefined
}

/** Why a file is not taken, as an id under `problems.file`. */
export type FileFault = 'empty' | 'camera_only' | 'type' | 'name_differs' | 'photo_type'

type JudgedFile = { ok: true; type: FileType } | { ok: false; fault: FileFault }

/** Endings and announced types that go with what the bytes are. */
const SAID: Record<FileType, { endings: string[]; announced: string[] }> = {
  'image/jpeg': { endings: ['jpg', 'jpeg', 'jpe', 'jfif'], announced: ['image/jpeg', 'image/jpg', 'image/pjpeg'] },
  'image/png': { endings: ['png'], announced: ['image/png'] },
  'image/webp': { endings: ['webp'], announced: ['image/webp'] },
  'application/pdf': { endings: ['pdf'], announced: ['application/pdf'] },
}
const NOTHING_ANNOUNCED = ['', 'application/octet-stream']
const CAMERA_ONLY = ['image/heic', 'image/heif', 'image/heic-sequence', 'image/heif-sequence', 'image/avif', 'image/tiff', 'image/x-canon-cr2', 'image/x-canon-cr3', 'image/x-nikon-nef', 'image/x-sony-arw', 'image/x-adobe-dng', 'image/x-fujifilm-raf', 'image/x-olympus-orf', 'image/x-panasonic-rw2']
/** Bytes that show nothing may still come from a camera. */
const CAMERA_ENDINGS = ['heic', 'heif', 'avif', 'tif', 'tiff', 'dng', 'cr2', 'cr3', 'nef', 'arw', 'raf', 'orf', 'rw2']

/**
 * What a file is, by its bytes; its name and its announced type must not say otherwise. Taken are JPEG, PNG, WebP and, as a paper, PDF.
 * The same judgement when a file is chosen and when it comes in.
 */
export function judgeFileType({ name, announced, bytes, found }: SeenFile, kind: FileKind): JudgedFile {
  if (bytes === 0) return refuse('empty')
  const ending = /\.([A-Za-z0-9]{1,8})$/.exec(name.trim())?.[1]?.toLowerCase()
  if (found === undefined ? CAMERA_ENDINGS.includes(ending ?? '') : CAMERA_ONLY.includes(found)) return refuse('camera_only')
  const type = FILE_TYPES.find((known) => known === found)
  if (type === undefined) return refuse('type')
  const said = SAID[type]
  if (ending !== undefined && !said.endings.includes(ending)) return refuse('name_differs')
  if (![...NOTHING_ANNOUNCED, ...said.announced].includes(announced.toLowerCase())) return refuse('name_differs')
  if (kind === 'photo' && type === 'application/pdf') return refuse('photo_type')
  return { ok: true, type }
}

const refuse = (fault: FileFault): JudgedFile => ({ ok: false, fault })
