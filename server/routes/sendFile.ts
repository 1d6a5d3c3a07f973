import type { FileToSend } from '../services/files/readFiles.ts'
import type { RouteCall } from './defineRoute.ts'

/**
 * Sends a file that somebody else made, so that no browser runs anything in it: saved under its own name, never opened in
 * the register's place. A browser asks again each time, and is told when it has it already.
 */
export async function sendFile({ request, response }: Pick<RouteCall<unknown, unknown, unknown, unknown>, 'request' | 'response'>, file: FileToSend): Promise<void> {
  response.set({
    'Content-Security-Policy': "default-src 'none'; sandbox",
    'Cache-Control': 'private, no-cache',
    ETag: `"${file.tag}"`,
  })
  if (request.fresh) return void response.status(304).end()
  const bytes = await file.read()
  response.attachment(file.name).type(file.type).set('Content-Length', String(bytes.length))
  response.end(bytes)
}
