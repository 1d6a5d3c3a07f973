import { once } from 'node:events'
import { pipeline } from 'node:stream/promises'
import type { ReportJob } from '../reports/renderReport.ts'
import type { RouteCall } from './defineRoute.ts'

interface Sent {
  fileName: string
  /** Asked when the document is drawn and nothing of it is sent; what it throws is answered in its stead. */
  beforeSending?: () => Promise<void>
}

/** Streams a report as it is drawn; shown in the browser under its own name. */
export async function sendReport({ services, response }: Pick<RouteCall<unknown, unknown, unknown, unknown>, 'services' | 'response'>, job: ReportJob, { fileName, beforeSending }: Sent): Promise<void> {
  const document = services.reports.render(job)
  if (beforeSending) {
    await once(document, 'readable')
    await beforeSending().catch((error: unknown) => {
      document.destroy()
      throw error
    })
  }
  response.status(200).type('application/pdf').set({
    'Content-Disposition': `inline; filename="${fileName}"`,
    'Cache-Control': 'private, no-store',
  })
  await pipeline(document, response)
}
