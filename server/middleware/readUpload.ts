import type { Request, Response } from 'express'
import multer, { MulterError } from 'multer'
import { MOST_FILE_BYTES } from '../../shared/contract/attachment.ts'
import { AppError, invalid } from '../errors.ts'
import type { UploadedFile } from '../services/files/judgeFile.ts'

const LIMITS = { fileSize: MOST_FILE_BYTES, files: 1, fields: 10, parts: 11, fieldNameSize: 60, fieldSize: 1_000, headerPairs: 20, fieldNestingDepth: 0 }
/** In memory: a request that breaks off leaves nothing behind. */
const receive = multer({ storage: multer.memoryStorage(), defParamCharset: 'utf8', limits: LIMITS }).single('file')

/** The fields and the one file of a multipart request. @throws {AppError} bad-request, too-large, wrong-type, invalid-input. */
export async function readUpload(request: Request, response: Response): Promise<{ fields: Record<string, string>; file: UploadedFile }> {
  if (!request.is('multipart/form-data')) throw new AppError('wrong-type', 'multipart')
  await new Promise<void>((resolve, reject) => {
    receive(request, response, (fault?: unknown) => {
      if (fault === undefined || fault === null) resolve()
      else reject(readFault(fault))
    })
  })
  const { file } = request
  if (!file) throw invalid([{ path: 'file', code: 'field.required' }])
  return {
    fields: { ...(request.body as Record<string, string>) },
    file: { name: file.originalname, announced: file.mimetype, bytes: file.buffer },
  }
}

/** The reader of multipart knows its own limits by code; every other fault of it is a request that could not be read. */
function readFault(fault: unknown): AppError {
  if (!(fault instanceof MulterError)) return new AppError('bad-request', 'unreadable_upload')
  if (fault.code === 'LIMIT_FILE_SIZE') return new AppError('too-large', 'file.too_large', { errors: [{ path: 'file', code: 'file.too_large' }] })
  if (fault.code === 'LIMIT_UNEXPECTED_FILE' && fault.field !== 'file') return invalid([{ path: (fault.field ?? '').slice(0, 80), code: 'unknown_field' }])
  return new AppError('too-large', 'too_many_parts')
}
