import type { IncomingMessage } from 'node:http'
import express, { type RequestHandler } from 'express'
import { AppError } from '../errors.ts'
import { scanJson } from './scanJson.ts'

/**
 * Reads a JSON body of UTF-8 and refuses, with 400, what a parser would quietly make something else of.
 * @param limit longest body, such as `1mb`.
 */
export function readJson(limit: string): RequestHandler[] {
  // The parser gives whatever `verify` throws a status of its own, so the fault is kept and thrown behind it.
  const faults = new WeakMap<IncomingMessage, string>()
  const parse = express.json({
    limit,
    inflate: true,
    verify: (request, _response, body, encoding) => {
      const fault = findFault(body, encoding)
      if (fault !== null) faults.set(request, fault)
    },
  })
  const refuse: RequestHandler = (request, _response, next) => {
    const fault = faults.get(request)
    next(fault === undefined ? undefined : new AppError('bad-request', fault))
  }
  return [parse, refuse]
}

function findFault(body: Buffer, encoding: string | null): string | null {
  if (encoding !== null && encoding !== 'utf-8') return 'unreadable'
  try {
    return scanJson(new TextDecoder('utf-8', { fatal: true }).decode(body))
  } catch {
    // Bytes that are no UTF-8: the decoder's only answer is to throw.
    return 'unreadable'
  }
}
