import type { RequestHandler } from 'express'
import { AppError, forbidden } from '../errors.ts'

const READING = new Set(['GET', 'HEAD', 'OPTIONS'])

/** Writing needs our own header, which a page of another site cannot set, and JSON or one file when there is a body. */
export const refuseForeign: RequestHandler = (request, _response, next) => {
  if (READING.has(request.method)) return next()
  if (request.get('X-Requested-With') !== 'drenchleaf') return next(forbidden('foreign_request'))
  const hasBody = request.get('Transfer-Encoding') !== undefined || Number(request.get('Content-Length') ?? 0) > 0
  if (hasBody && !request.is(['application/json', 'multipart/form-data'])) return next(new AppError('wrong-type', 'wrong_type'))
  next()
}
