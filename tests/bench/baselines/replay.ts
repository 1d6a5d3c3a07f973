import type { PoolClient, QueryResultRow } from 'pg'
import { v7 as uuidV7 } from 'uuid'
import type { Recorded } from '../../support/recordStatements.ts'

const UUID_V7 = /^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[0-9a-f]{4}-[0-9a-f]{12}$/

/** What stands for a recorded value this time; given the rows of each statement as they come. */
export type Swap = Map<unknown, unknown>

/**
 * Sends recorded statements again as they were, one after the other, with other values where `swap` has them, and a new id for each
 * id that the recorded run had made itself: all that is neither in `known` nor swapped.
 * @param seen hears each statement's rows, and may add to `swap`.
 * @returns the rows of the last statement that gave any.
 */
export async function replay(
  client: PoolClient, statements: readonly Recorded[], known: ReadonlySet<unknown>, swap: Swap,
  seen: (text: string, rows: QueryResultRow[]) => void = () => undefined,
): Promise<QueryResultRow[]> {
  let last: QueryResultRow[] = []
  const valueOf = (value: unknown): unknown => {
    if (swap.has(value)) return swap.get(value)
    return typeof value === 'string' && UUID_V7.test(value) && !known.has(value) ? uuidV7() : value
  }
  for (const { text, params } of statements) {
    const { rows } = await client.query<QueryResultRow>(text, params.map(valueOf))
    if (rows.length > 0) last = rows
    seen(text, rows)
  }
  return last
}
