import { pipeline } from 'node:stream/promises'
import type { ReportJob } from '../reports/renderReport.ts'
import type { RouteCall } from './defineRoute.ts'

/** Streams a report as it is drawn; shown in the browser under its own name. */
export async function sendReport({ services, response }: Pick<RouteCall<unknown, unknown, unknown, unknown>, 'services' | 'response'>, job: ReportJob, fileName: string): Promise<void> {
  response.status(200).type('application/pdf').set({
    'Content-Disposition': `inline; filename="${fileName}"`,
    'Cache-Control': 'private, no-store',
  })
  await pipeline(services.reports.render(job), response)
}
