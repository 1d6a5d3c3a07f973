import { z } from 'zod'
import { defineLetter } from './letterKind.ts'

const FACTOR_NEWS = ['set', 'removed', 'codes', 'reset'] as const
export type FactorNews = (typeof FACTOR_NEWS)[number]

/** An account's second factor is another one now, is gone, or has other recovery codes. `time` is UTC, HH:MM. */
export const factorChanged = defineLetter({
  params: z.strictObject({ news: z.enum(FACTOR_NEWS), email: z.string(), dayOn: z.string(), time: z.string() }),
  secrets: [],
  write: ({ news, email, dayOn, time }, say) => ({
    subject: say(`mail.factorChanged.${news}Subject`),
    paragraphs: [say(`mail.factorChanged.${news}`, { email, dayOn, time })],
    action: { label: say('mail.factorChanged.action'), path: '/reset' },
    closing: [say('mail.factorChanged.stranger')],
  }),
})
