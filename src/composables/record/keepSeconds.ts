import type { BlockLine, RecordContentInput } from '../../../shared/contract/recordContent.ts'

const MINUTE_MS = 60_000
const minuteOf = (instant: string): number => Math.floor(Date.parse(instant) / MINUTE_MS)

/** A form's clock shows minutes: a time that was not changed keeps the seconds that stand. */
export function keepSeconds(content: RecordContentInput, standing: readonly BlockLine[]): RecordContentInput {
  const keep = (typed: string | null | undefined, stood: string | null): string | null =>
    typed && stood && minuteOf(typed) === minuteOf(stood) ? stood : (typed ?? null)
  const lines = content.lines.map((line) => {
    const stood = standing.find(({ blockId, startedAt }) => blockId === line.blockId && keep(line.startedAt, startedAt) === startedAt) ?? standing.find(({ blockId }) => blockId === line.blockId)
    return stood ? { ...line, startedAt: keep(line.startedAt, stood.startedAt), endedAt: keep(line.endedAt, stood.endedAt) } : line
  })
  return { ...content, lines }
}
