import type { BrowserContext } from '@playwright/test'

/**
 * What went wrong in the pages of a context, in words; empty where nothing did.
 * @param strict also notes every answer from 400 up: pages that ask only for what is there and may be read.
 */
export async function watchPages(context: BrowserContext, { strict = false } = {}): Promise<string[]> {
  const found: string[] = []
  await context.exposeBinding('tellViolation', ({ page }, words: string) => { found.push(`${page.url()}: ${words}`) })
  await context.addInitScript(() => {
    document.addEventListener('securitypolicyviolation', ({ violatedDirective, blockedURI, sample }) => {
      const { tellViolation } = globalThis as unknown as { tellViolation: (words: string) => void }
      tellViolation(`policy ${violatedDirective} ${blockedURI} ${sample}`)
    })
  })
  context.on('weberror', (error) => { found.push(`page error: ${error.error().message}`) })
  context.on('console', (message) => {
    // What is read without signing in or is not there answers 4xx by design; the browser notes each such answer.
    if (message.type() === 'error' && (strict || !/status of 40[14]/.test(message.text()))) found.push(`console: ${message.text()}`)
  })
  context.on('response', (answer) => {
    const isOurs = answer.url().includes('/api/')
    if (answer.status() >= 500 || ((strict || !isOurs) && answer.status() >= 400)) found.push(`${answer.status()} ${answer.url()}`)
  })
  context.on('requestfailed', (request) => {
    // A page left while a tile was still coming ends that request.
    const why = request.failure()?.errorText ?? ''
    if (why !== 'net::ERR_ABORTED') found.push(`${why} ${request.url()}`)
  })
  return found
}
