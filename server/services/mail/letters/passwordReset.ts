import { z } from 'zod'
import { defineLetter } from './letterKind.ts'

/** Somebody asked for a new password under this e-mail. */
export const passwordReset = defineLetter({
  params: z.strictObject({ email: z.string(), token: z.string(), minutes: z.number() }),
  secrets: ['token'],
  write: ({ email, token, minutes }, say) => ({
    subject: say('mail.passwordReset.subject'),
    paragraphs: [say('mail.passwordReset.text', { email })],
    action: { label: say('mail.passwordReset.action'), path: `/reset/${token}` },
    closing: [say('mail.passwordReset.until', { minutes }), say('mail.passwordReset.stranger')],
  }),
})
