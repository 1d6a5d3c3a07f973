import { isDeepStrictEqual } from 'node:util'
import { summarise, type Round, type Summary } from './statistics.ts'

/** One side of a figure: does the work so many times, one after the other. */
type Side = (times: number) => Promise<unknown>

export interface Contest {
  ours: Side
  baseline: Side
  times: number
  rounds: number
  /** What is compared, of the milliseconds a turn took; the milliseconds themselves where nothing is said. */
  read?: (ms: number) => number
}

/** Both sides in turn, A B B: first unmeasured, then so many rounds. */
export async function measureRounds({ ours, baseline, times, rounds, read = (ms) => ms }: Contest): Promise<Summary> {
  for (const side of [ours, baseline, ours, baseline]) await side(times)
  const measured: Round[] = []
  for (let round = 0; round < rounds; round++) {
    measured.push({ ours: read(await timeOf(ours, times)), baseline: read(await timeOf(baseline, times)), again: read(await timeOf(baseline, times)) })
  }
  return summarise(measured)
}

async function timeOf(side: Side, times: number): Promise<number> {
  const startedAt = performance.now()
  await side(times)
  return (performance.now() - startedAt) / times
}

/** What is compared must do the same. @throws {Error} where the answers differ. */
export function assertSame(figure: string, ours: unknown, baseline: unknown): void {
  if (isDeepStrictEqual(ours, baseline)) return
  throw new Error(`${figure}: the baseline answers otherwise\n${JSON.stringify(ours).slice(0, 2_000)}\n${JSON.stringify(baseline).slice(0, 2_000)}`)
}
