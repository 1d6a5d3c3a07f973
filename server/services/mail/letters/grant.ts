import { z } from 'zod'
import { defineLetter } from './letterKind.ts'

/** Seasons of a farm are opened to a certifier; who has no account yet gets a link, good once, to make one. */
export const grant = defineLetter({
  params: z.strictObject({ farm: z.string(), by: z.string(), organisation: z.string(), seasons: z.string(), endsOn: z.string(), token: z.string(), untilOn: z.string() }),
  secrets: ['token'],
  write: ({ farm, by, organisation, seasons, endsOn, token, untilOn }, say) => ({
    subject: say('mail.grant.subject', { farm, seasons }),
    paragraphs: [say('mail.grant.text', { farm, by, organisation }), say('mail.grant.readOnly')],
    rows: [
      { label: say('mail.grant.farm'), value: farm },
      { label: say('mail.grant.seasons'), value: seasons },
      { label: say('mail.grant.endsOn'), value: say('mail.grant.day', { endsOn }) },
    ],
    action: token === '' ? { label: say('mail.grant.open'), path: '/farms' } : { label: say('mail.grant.accept'), path: `/welcome/${token}` },
    closing: token === '' ? [] : [say('mail.invitation.until', { untilOn }), say('mail.invitation.stranger')],
  }),
})
