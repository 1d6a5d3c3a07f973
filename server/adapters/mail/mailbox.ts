import { z } from 'zod'
import { lineText } from '../../../shared/contract/text.ts'

/** One sender or receiver; an empty name is none. */
export interface Mailbox {
  name: string
  address: string
}

const mailboxSchema = z.object({ name: z.union([z.literal(''), lineText(120)]), address: z.email().max(254) })

/**
 * One mailbox out of its two parts, as they are: nothing in a name can add a header or another receiver.
 * @throws {RangeError} for a name with line breaks or controls in it, and for what is no single address.
 */
export function mailboxOf(address: string, name: string | null): Mailbox {
  const read = mailboxSchema.safeParse({ name: name ?? '', address })
  if (!read.success) throw new RangeError(`Not one mailbox: ${read.error.issues.map(({ path }) => path.join('.')).join(', ')}`)
  return read.data
}

/** A mailbox written as `address` or `Name <address>`; null if it is neither. */
export function readMailbox(text: string): Mailbox | null {
  const named = /^([^<>]*)<([^<>]+)>$/.exec(text.trim())
  const read = mailboxSchema.safeParse({ name: (named?.[1] ?? '').trim().replace(/^"(.*)"$/, '$1'), address: named?.[2] ?? text.trim() })
  return read.success ? read.data : null
}
