import nodemailer from 'nodemailer'
import type { Mailbox } from './mailbox.ts'
import { MailFault, type Mailer, type OutgoingMail } from './mailer.ts'

const CONNECT_MS = 10_000
const SILENCE_MS = 45_000
const CONNECTIONS = 3

/** Sends over SMTP. @param url of the server, smtp:// or smtps://, with user and password where it asks for them. */
export function createSmtpMailer(url: string, from: Mailbox): Mailer {
  const transport = nodemailer.createTransport({
    url, pool: true, maxConnections: CONNECTIONS,
    connectionTimeout: CONNECT_MS, greetingTimeout: CONNECT_MS, socketTimeout: SILENCE_MS,
    disableFileAccess: true, disableUrlAccess: true,
  })
  return {
    send: async ({ messageId, to, replyTo, language, writtenAt, subject, text, html }: OutgoingMail) => {
      try {
        await transport.sendMail({
          from, to, ...(replyTo && { replyTo }), envelope: { from: from.address, to: [to.address] },
          messageId, date: writtenAt, subject, text, html,
          headers: { 'Auto-Submitted': 'auto-generated', 'Content-Language': language },
        })
      } catch (error) {
        throw faultOf(error)
      }
    },
    close: () => Promise.resolve(transport.close()),
  }
}

const UNREACHABLE = new Set(['ECONNECTION', 'ETIMEDOUT', 'ESOCKET', 'EDNS', 'ECONNREFUSED', 'ECONNRESET', 'ETLS', 'EPROTOCOL'])

function faultOf(error: unknown): MailFault {
  const { code = '', responseCode } = error as { code?: string; responseCode?: number }
  const answer = responseCode ?? null
  if (code === 'EAUTH') return new MailFault('login', answer, error)
  if (answer !== null) return new MailFault('refused', answer, error)
  return new MailFault(UNREACHABLE.has(code) ? 'unreachable' : 'other', null, error)
}
