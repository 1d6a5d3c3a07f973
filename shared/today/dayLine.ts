import type { MessageId } from '../messages/en.ts'

/** One sentence of the day: its message, the count its plural follows, and the figures that stand in their own ink. */
export interface DaySentence {
  id: MessageId
  count: number
  figures: Record<string, { text: string; ink: 'eld' | 'wel' | 'mad' | 'pen' | 'plain' }>
}

export interface DayFacts {
  /** Block codes of each record of the reader's own that is started and not signed. */
  started: readonly string[]
  /** The same of others, with whose work it is. */
  startedByOthers: readonly { codes: string; name: string }[]
  /** Jobs whose last day is over, the longest late first. */
  lateJobs: readonly { code: string; days: number }[]
  dueJobs: number
  /** Blocks that nobody goes into yet, the first to end first: until what time, and on which day in words where that is not today. */
  keepOut: readonly { code: string; time: string; day: string | null }[]
  drafts: number
  signedToday: number
  /** Codes of lots past their last day that still hold something. */
  pastLots: readonly string[]
  /** Lots whose last day is at most 7 days away, with that day in words. */
  soonLots: readonly { code: string; day: string }[]
}

/**
 * What the day comes to, most urgent first: started work, the reader's own before that of others, jobs late and due, the lots that are past or end soon (the worse of both), drafts, the blocks to keep out of, what was signed.
 * @returns at least one sentence; a day with nothing in it says so.
 */
export function dayLine(facts: DayFacts): DaySentence[] {
  const ending = facts.pastLots.length > 0 ? pastSentence(facts) : soonSentence(facts)
  const waiting = [...startedSentence(facts), ...othersSentence(facts), ...lateSentence(facts), ...dueSentence(facts), ...ending, ...draftSentence(facts)]
  if (waiting.length === 0) waiting.push({ id: 'today.line.quiet', count: 0, figures: {} })
  return [...waiting, ...keepOutSentence(facts), ...signedSentence(facts)]
}

function startedSentence({ started }: DayFacts): DaySentence[] {
  const [only] = started
  if (only === undefined) return []
  if (started.length === 1) return [{ id: 'today.line.startedOne', count: 1, figures: { codes: { text: only, ink: 'wel' } } }]
  return [{ id: 'today.line.startedMany', count: started.length, figures: { figure: { text: String(started.length), ink: 'wel' } } }]
}

function othersSentence({ startedByOthers }: DayFacts): DaySentence[] {
  const [only] = startedByOthers
  const count = startedByOthers.length
  if (only === undefined) return []
  if (count > 1) return [{ id: 'today.line.othersMany', count, figures: { figure: { text: String(count), ink: 'wel' } } }]
  return [{ id: 'today.line.othersOne', count, figures: { codes: { text: only.codes, ink: 'wel' }, name: { text: only.name, ink: 'plain' } } }]
}

function lateSentence({ lateJobs }: DayFacts): DaySentence[] {
  const [only] = lateJobs
  if (only === undefined) return []
  if (lateJobs.length > 1) return [{ id: 'today.line.lateMany', count: lateJobs.length, figures: { figure: { text: String(lateJobs.length), ink: 'mad' } } }]
  return [{ id: 'today.line.lateOne', count: only.days, figures: { code: { text: only.code, ink: 'mad' }, figure: { text: String(only.days), ink: 'mad' } } }]
}

function dueSentence({ dueJobs }: DayFacts): DaySentence[] {
  return dueJobs === 0 ? [] : [{ id: 'today.line.due', count: dueJobs, figures: { figure: { text: String(dueJobs), ink: 'wel' } } }]
}

function draftSentence({ drafts }: DayFacts): DaySentence[] {
  if (drafts === 0) return []
  return [{ id: 'today.line.drafts', count: drafts, figures: { figure: { text: String(drafts), ink: 'pen' } } }]
}

function pastSentence({ pastLots }: DayFacts): DaySentence[] {
  const [only] = pastLots
  if (only === undefined) return []
  const many = pastLots.length > 1
  const text = many ? String(pastLots.length) : only
  return [{ id: many ? 'today.line.pastMany' : 'today.line.pastOne', count: pastLots.length, figures: { figure: { text, ink: 'mad' } } }]
}

function soonSentence({ soonLots }: DayFacts): DaySentence[] {
  const [only] = soonLots
  if (only === undefined) return []
  if (soonLots.length > 1) {
    return [{ id: 'today.line.soonMany', count: soonLots.length, figures: { figure: { text: String(soonLots.length), ink: 'wel' } } }]
  }
  return [{
    id: 'today.line.soonOne',
    count: 1,
    figures: { code: { text: only.code, ink: 'plain' }, figure: { text: only.day, ink: 'wel' } },
  }]
}

function keepOutSentence({ keepOut }: DayFacts): DaySentence[] {
  const [only] = keepOut
  if (only === undefined) return []
  if (keepOut.length > 1) return [{ id: 'today.line.keepOutMany', count: keepOut.length, figures: { figure: { text: String(keepOut.length), ink: 'mad' } } }]
  const figures = { code: { text: only.code, ink: 'mad' }, time: { text: only.time, ink: 'mad' } } as const
  return [only.day === null ? { id: 'today.line.keepOutOne', count: 1, figures } : { id: 'today.line.keepOutOneOn', count: 1, figures: { ...figures, day: { text: only.day, ink: 'mad' } } }]
}

function signedSentence({ signedToday }: DayFacts): DaySentence[] {
  if (signedToday === 0) return [{ id: 'today.line.noneSigned', count: 0, figures: {} }]
  return [{ id: 'today.line.signed', count: signedToday, figures: { figure: { text: String(signedToday), ink: 'eld' } } }]
}
