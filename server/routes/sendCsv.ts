import { pipeline } from 'node:stream/promises'
import type { Readable } from 'node:stream'
import { translate, type Language } from '../../shared/messages/translate.ts'
import type { RouteCall } from './defineRoute.ts'

/** Streams a table as it is read, to be kept as a file under the day's name. */
export async function sendCsv({ services, response }: Pick<RouteCall<unknown, unknown, unknown, unknown>, 'services' | 'response'>, table: Readable, language: Language): Promise<void> {
  const day = services.clock.now().toISOString().slice(0, 10)
  response.status(200).type('text/csv; charset=utf-8').set({
    'Content-Disposition': `attachment; filename="${translate(language, 'registerPrint.file')}-${day}.csv"`,
    'Cache-Control': 'private, no-store',
  })
  await pipeline(table, response)
}
