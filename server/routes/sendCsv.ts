import { pipeline } from 'node:stream/promises'
import type { Readable } from 'node:stream'
import type { RouteCall } from './defineRoute.ts'

/** Streams a table as it is read, to be kept as a file under its name and the day's. */
export async function sendCsv({ services, response }: Pick<RouteCall<unknown, unknown, unknown, unknown>, 'services' | 'response'>, table: Readable, name: string): Promise<void> {
  const day = services.clock.now().toISOString().slice(0, 10)
  response.status(200).type('text/csv; charset=utf-8').set({
    'Content-Disposition': `attachment; filename="${name}-${day}.csv"`,
    'Cache-Control': 'private, no-store',
  })
  await pipeline(table, response)
}
