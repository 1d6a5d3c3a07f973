import { civilDateSchema } from '../../../shared/contract/common.ts'
import type { MessageId } from '../../../shared/messages/en.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { liesAhead } from '../../../shared/time/liesAhead.ts'
import type { Gaps } from './gaps.ts'
import { endMoment, type MomentDraft } from './lineDraft.ts'
import { instantOf } from './recordContent.ts'
import { writtenLines, type RecordDraft } from './recordDraft.ts'

const isDay = (date: string): boolean => date === '' || civilDateSchema.safeParse(date).success

/** Days of a year that no record can have, by `lines.0.day` and `workedInOn`: they keep it from being signed. */
export function yearFaults(draft: RecordDraft): Gaps {
  const days = writtenLines(draft).map(({ start }, index) => [`lines.${index}.day`, start.date] as const)
  const workedIn = draft.method === 'solid' ? [['workedInOn', draft.workedInOn] as const] : []
  return Object.fromEntries([...days, ...workedIn].filter(([, date]) => !isDay(date)).map(([path]) => [path, 'problems.date.years' as const]))
}

/**
 * What is wrong with when the work was, said as soon as it is typed: the day by `lines.0.day`, a time of this day by `lines.0.startedAt`.
 * What is still to come is so by this device's clock, which may be wrong: it is said, and the server judges it.
 */
export function timeFaults(draft: RecordDraft, zone: string, now: Date): Gaps {
  const today = civilDateIn(zone, now.toISOString())
  const ahead = (moment: MomentDraft): boolean => {
    const read = instantOf(moment, zone)
    return read?.ok === true && liesAhead(read.instant, now)
  }
  const ofLine = (line: RecordDraft['lines'][number]): readonly (readonly [string, MessageId])[] => {
    if (line.start.date > today) return [['day', 'recordForm.gap.dayToCome']]
    return [...(ahead(line.start) ? [['startedAt', 'problems.time.future'] as const] : []), ...(ahead(endMoment(line)) ? [['endedAt', 'problems.time.future'] as const] : [])]
  }
  return {
    ...Object.fromEntries(writtenLines(draft).flatMap((line, index) => ofLine(line).map(([name, words]) => [`lines.${index}.${name}`, words]))),
    ...(draft.method === 'solid' && draft.workedInOn > today && { workedInOn: 'recordForm.gap.dayToCome' as const }),
    ...yearFaults(draft),
  }
}
