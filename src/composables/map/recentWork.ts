import type { RegisterRow } from '../../../shared/contract/record.ts'

/** Which work was done on a block in the last days. */
export interface RecentWork { foliar: boolean; drench: boolean }

/** Days that count as the last ones. */
export const RECENT_DAYS = 3
const DAY_MS = 86_400_000

/**
 * The work of the last days by block. A solid that was spread counts with what reaches the soil.
 * @param rows of the register, in any order; what is withdrawn or never began is left out.
 */
export function recentWork(rows: readonly RegisterRow[], now: Date): Map<string, RecentWork> {
  const found = new Map<string, RecentWork>()
  for (const { state, startedAt, method, blocks } of rows) {
    if (state === 'withdrawn' || startedAt === null || now.getTime() - Date.parse(startedAt) > RECENT_DAYS * DAY_MS) continue
    const kind = method === 'foliar' ? 'foliar' : 'drench'
    for (const { id } of blocks) found.set(id, { ...(found.get(id) ?? { foliar: false, drench: false }), [kind]: true })
  }
  return found
}
