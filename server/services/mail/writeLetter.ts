import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import { mailboxOf } from '../../adapters/mail/mailbox.ts'
import type { OutgoingMail } from '../../adapters/mail/mailer.ts'
import type { Letter } from '../../entities/Letter.ts'
import { publicAddress } from '../publicAddress.ts'
import type { Services } from '../services.ts'
import { layOutHtml, layOutText, type LaidOut } from './layOutLetter.ts'
import type { Say } from './letters/letterKind.ts'
import { isLetterName, LETTER_KINDS } from './letters/letterKinds.ts'

/** A letter of the outbox as it goes out. @throws {RangeError} for a kind or content that this version does not know. */
export function writeLetter({ config }: Pick<Services, 'config'>, letter: Letter): OutgoingMail {
  const { language } = letter
  const address = publicAddress(config)
  const say: Say = (id, params = {}) => renderMessage(language, { id, params: { address, ...params } })
  const { action, ...text } = wordsOf(letter, say)
  const laidOut: LaidOut = {
    ...text,
    language,
    greeting: letter.toName === null ? say('mail.greeting') : say('mail.greetingTo', { name: letter.toName }),
    ...(action && { action: { label: action.label, url: `${address}${action.path}` } }),
    foot: [say('mail.foot'), ...(letter.replyEmail === null ? [say('mail.noReply')] : [])],
  }
  return {
    messageId: letter.messageId, to: mailboxOf(letter.toEmail, letter.toName), replyTo: letter.replyEmail === null ? null : mailboxOf(letter.replyEmail, letter.replyName),
    language, writtenAt: letter.createdAt, subject: text.subject, text: layOutText(laidOut), html: layOutHtml(laidOut),
  }
}

function wordsOf({ kind: name, params }: Letter, say: Say) {
  if (!isLetterName(name)) throw new RangeError(`No letter "${name}"`)
  const kind = LETTER_KINDS[name]
  const read = kind.params.safeParse(params)
  if (!read.success) throw new RangeError(`Not the content of a letter "${name}"`)
  // Each kind's schema made exactly what its `write` takes; a union of them cannot say so.
  return (kind.write as (params: unknown, say: Say) => ReturnType<typeof kind.write>)(read.data, say)
}
