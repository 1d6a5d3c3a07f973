import { z } from 'zod'
import { defineLetter } from './letterKind.ts'

/** An account's password was changed; whoever did not do it learns what to do. `time` is UTC, HH:MM. */
export const passwordChanged = defineLetter({
  params: z.strictObject({ email: z.string(), dayOn: z.string(), time: z.string() }),
  secrets: [],
  write: ({ email, dayOn, time }, say) => ({
    subject: say('mail.passwordChanged.subject'),
    paragraphs: [say('mail.passwordChanged.text', { email, dayOn, time }), say('mail.passwordChanged.ended')],
    action: { label: say('mail.passwordChanged.action'), path: '/reset' },
    closing: [say('mail.passwordChanged.stranger')],
  }),
})
