import { z } from 'zod'
import { defineLetter } from './letterKind.ts'

/** What about a sign-in the account's e-mail is told. */
const SIGN_IN_NEWS = ['newDevice', 'codeWrong', 'afterFailures'] as const
export type SignInNews = (typeof SIGN_IN_NEWS)[number]

/** Somebody signed in from where nobody had, knew the password and not the code, or got in after many tries. `time` is UTC, HH:MM. */
export const signIn = defineLetter({
  params: z.strictObject({
    news: z.enum(SIGN_IN_NEWS), email: z.string(), dayOn: z.string(), time: z.string(), tries: z.number().int(), device: z.string().nullable(), network: z.string().nullable(),
  }),
  secrets: [],
  write: ({ news, email, dayOn, time, tries, device, network }, say) => ({
    subject: say(`mail.signIn.${news}Subject`, { tries }),
    paragraphs: [say(`mail.signIn.${news}`, { email, tries })],
    rows: [
      { label: say('mail.signIn.when'), value: say('mail.signIn.at', { dayOn, time }) },
      ...(device === null ? [] : [{ label: say('mail.signIn.device'), value: device }]),
      ...(network === null ? [] : [{ label: say('mail.signIn.network'), value: network }]),
    ],
    action: { label: say('mail.signIn.action'), path: '/reset' },
    closing: [say('mail.signIn.wasYou'), say('mail.signIn.stranger')],
  }),
})
