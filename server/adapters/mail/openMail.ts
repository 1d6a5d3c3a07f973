import type { MailConfig } from '../../config.ts'
import type { KeptMail } from './keptMail.ts'
import type { Mailer } from './mailer.ts'

/** The way out for letters; the libraries are read with the one that is used. */
export async function openMail({ smtpUrl, from, keptFile }: MailConfig): Promise<{ mailer: Mailer; keptMail: KeptMail | null }> {
  if (smtpUrl === null) {
    const { openKeptMail } = await import('./keptMail.ts')
    const { mailer, kept } = await openKeptMail(from, keptFile)
    return { mailer, keptMail: kept }
  }
  const { createSmtpMailer } = await import('./smtpMailer.ts')
  return { mailer: createSmtpMailer(smtpUrl, from), keptMail: null }
}
