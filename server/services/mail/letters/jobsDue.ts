import { z } from 'zod'
import { defineLetter } from './letterKind.ts'

const lines = z.array(z.strictObject({ preparation: z.string(), blocks: z.string() }))

/** What is due and late on the morning of a day. */
export const jobsDue = defineLetter({
  params: z.strictObject({ farm: z.string(), todayOn: z.string(), dueCount: z.number(), lateCount: z.number(), due: lines, late: lines }),
  secrets: [],
  write: ({ farm, todayOn, dueCount, lateCount, due, late }, say) => ({
    subject: say(lateCount > 0 ? 'mail.jobsDue.subjectLate' : 'mail.jobsDue.subject', { farm, dueCount, lateCount }),
    paragraphs: [say('mail.jobsDue.text', { farm, todayOn })],
    rows: [
      ...late.map(({ preparation, blocks }) => ({ label: say('mail.jobsDue.late', { preparation }), value: blocks })),
      ...due.map(({ preparation, blocks }) => ({ label: say('mail.jobsDue.due', { preparation }), value: blocks })),
    ],
    action: { label: say('mail.jobsDue.action'), path: '/rounds' },
    closing: [say('mail.jobsDue.why')],
  }),
})
