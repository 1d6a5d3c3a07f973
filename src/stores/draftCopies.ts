import type { Draft } from './draftTypes.ts'

const PREFIX = 'drenchleaf.typing.'

function isDraft(found: unknown): found is Draft {
  const texts = ['id', 'kind', 'farmId', 'accountId', 'begunAt', 'updatedAt'] as const
  return typeof found === 'object' && found !== null && 'content' in found && texts.every((name) => typeof (found as Draft)[name] === 'string')
}

function copyAt(key: string): Draft | null {
  try {
    const found: unknown = JSON.parse(localStorage.getItem(key) ?? 'null')
    return isDraft(found) ? found : null
  } catch {
    return null
  }
}

/**
 * Copies of drafts written the moment they are typed: the database answers later, and a page that is being left does not wait for it.
 * A device that lends no room, or has none left, keeps the draft by the database alone.
 */
export const draftCopies = {
  put(draft: Draft): void {
    try { localStorage.setItem(PREFIX + draft.id, JSON.stringify(draft)) } catch { /* no room: the database writes it shortly */ }
  },
  /** The copy of that draft, else null. */
  of: (id: string): Draft | null => copyAt(PREFIX + id),
  /** Every copy the database may not have yet. */
  all(): Draft[] {
    try {
      return Object.keys(localStorage).filter((key) => key.startsWith(PREFIX)).flatMap((key) => copyAt(key) ?? [])
    } catch {
      return []
    }
  },
  /** Drops the copy of that draft, unless it is newer than `upTo` (an instant, RFC 3339). */
  drop(id: string, upTo?: string): void {
    try {
      const copy = copyAt(PREFIX + id)
      if (upTo === undefined || copy === null || copy.updatedAt <= upTo) localStorage.removeItem(PREFIX + id)
    } catch { /* a device that lends no room holds no copy */ }
  },
}
