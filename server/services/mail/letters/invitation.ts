import { z } from 'zod'
import { roleSchema } from '../../../../shared/contract/session.ts'
import { defineLetter } from './letterKind.ts'

/** Somebody is asked onto a farm; the link is good once. */
export const invitation = defineLetter({
  params: z.strictObject({ farm: z.string(), by: z.string(), role: roleSchema, token: z.string(), untilOn: z.string() }),
  secrets: ['token'],
  write: ({ farm, by, role, token, untilOn }, say) => ({
    subject: say('mail.invitation.subject', { farm }),
    paragraphs: [say('mail.invitation.text', { farm, by }), say(`mail.invitation.${role}`)],
    action: { label: say('mail.invitation.action'), path: `/welcome/${token}` },
    closing: [say('mail.invitation.until', { untilOn }), say('mail.invitation.stranger')],
  }),
})
