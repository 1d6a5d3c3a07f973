import type { Mailbox } from './mailbox.ts'

/** A letter ready to go. */
export interface OutgoingMail {
  /** With its angle brackets. */
  messageId: string
  to: Mailbox
  replyTo: Mailbox | null
  language: 'en' | 'es'
  writtenAt: Date
  subject: string
  text: string
  html: string
}

/** Hands letters to a mail server. */
export interface Mailer {
  /** @throws {MailFault} if the server did not take it. */
  send(mail: OutgoingMail): Promise<void>
  close(): Promise<void>
}

/** Why a letter was not taken. */
export class MailFault extends Error {
  constructor(
    readonly reason: 'unreachable' | 'refused' | 'login' | 'other',
    /** The number that the server answered with (RFC 5321, 4.2), where it answered. */
    readonly answer: number | null,
    cause: unknown,
  ) {
    super(`mail: ${reason}`, { cause })
  }
}
