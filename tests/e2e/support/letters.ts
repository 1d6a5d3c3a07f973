import type { APIRequestContext } from '@playwright/test'
import { expect } from './test.ts'

/** The path of the link in the newest letter to an e-mail, as the stand-in for a mail server kept it. */
export async function linkTo(request: APIRequestContext, email: string, subject: string): Promise<string> {
  let link = ''
  await expect.poll(async () => {
    const { items } = (await (await request.get('/dev/mail', { headers: { Accept: 'application/json' } })).json()) as { items: { to: string[]; subject: string; text: string }[] }
    link = /https?:\/\/[^/\s]+(\/(?:welcome|reset)\/[\w-]+)/.exec(items.find((item) => item.to.includes(email) && item.subject === subject)?.text ?? '')?.[1] ?? ''
    return link
  }).not.toBe('')
  return link
}
