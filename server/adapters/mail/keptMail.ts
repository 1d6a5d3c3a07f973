import { appendFile, readFile, writeFile } from 'node:fs/promises'
import { once } from 'node:events'
import type { AddressInfo } from 'node:net'
import { simpleParser, type AddressObject } from 'mailparser'
import { SMTPServer } from 'smtp-server'
import type { Mailbox } from './mailbox.ts'
import type { Mailer } from './mailer.ts'
import { createSmtpMailer } from './smtpMailer.ts'

/** A letter as a mail server of our own received it. */
export interface KeptLetter {
  id: string
  messageId: string
  /** The addresses it was handed over for, whatever its head says. */
  to: string[]
  from: string
  replyTo: string | null
  language: string
  subject: string
  text: string
  html: string
  receivedAt: string
}

/** Letters that went no further than this machine. */
export interface KeptMail {
  /** Newest first. */
  list(): KeptLetter[]
}

const MOST_KEPT = 500

/**
 * The local stand-in for a mail server: SMTP on loopback to which letters are really sent, and which keeps them. It starts with the
 * first letter. @param file where they outlive a restart, readable by its owner alone; null for in memory alone.
 */
export async function openKeptMail(from: Mailbox, file: string | null): Promise<{ mailer: Mailer; kept: KeptMail }> {
  const letters = file === null ? [] : await readKept(file)
  let post: Promise<{ mailer: Mailer; server: SMTPServer }> | undefined

  const take = async (raw: NodeJS.ReadableStream, to: string[]): Promise<void> => {
    const letter = await readLetter(raw, to, Number(letters.at(-1)?.id ?? 0) + 1)
    letters.push(letter)
    if (letters.length > MOST_KEPT) letters.splice(0, letters.length - MOST_KEPT)
    if (file !== null) await appendFile(file, `${JSON.stringify(letter)}\n`, { mode: 0o600 })
  }

  return {
    kept: { list: () => letters.toReversed() },
    mailer: {
      send: async (mail) => (await (post ??= openPost(from, take))).mailer.send(mail),
      close: async () => {
        const opened = await post
        await opened?.mailer.close()
        if (opened) await new Promise<void>((resolve) => opened.server.close(resolve))
      },
    },
  }
}

async function openPost(from: Mailbox, take: (raw: NodeJS.ReadableStream, to: string[]) => Promise<void>): Promise<{ mailer: Mailer; server: SMTPServer }> {
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    onData: (stream, session, done) => {
      take(stream, session.envelope.rcptTo.map(({ address }) => address)).then(() => done(), done)
    },
  })
  server.listen(0, '127.0.0.1')
  await once(server.server, 'listening')
  const { port } = server.server.address() as AddressInfo
  return { server, mailer: createSmtpMailer(`smtp://127.0.0.1:${port}`, from) }
}

async function readLetter(raw: NodeJS.ReadableStream, to: string[], number: number): Promise<KeptLetter> {
  const parsed = await simpleParser(raw as Parameters<typeof simpleParser>[0], { skipTextToHtml: true, skipImageLinks: true })
  const language = parsed.headers.get('content-language')
  return {
    id: String(number), messageId: parsed.messageId ?? '', to, from: addressOf(parsed.from) ?? '', replyTo: addressOf(parsed.replyTo),
    language: typeof language === 'string' ? language : '', subject: parsed.subject ?? '', text: parsed.text ?? '',
    html: typeof parsed.html === 'string' ? parsed.html : '', receivedAt: (parsed.date ?? new Date(0)).toISOString(),
  }
}

function addressOf(addresses: AddressObject | undefined): string | null {
  return addresses?.value[0]?.address ?? null
}

/** What an earlier start kept; a last line that broke off is left out. */
async function readKept(file: string): Promise<KeptLetter[]> {
  const text = await readFile(file, 'utf8').catch((error: NodeJS.ErrnoException) => {
    if (error.code === 'ENOENT') return ''
    throw error
  })
  const letters = text.split('\n').flatMap((line) => {
    try {
      return [JSON.parse(line) as KeptLetter]
    } catch {
      return []
    }
  }).slice(-MOST_KEPT)
  if (text !== '') await writeFile(file, letters.map((letter) => `${JSON.stringify(letter)}\n`).join(''), { mode: 0o600 })
  return letters
}
