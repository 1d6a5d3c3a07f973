import { canonicalText } from './canonicalText.ts'
import { sha256Hex } from './sha256Hex.ts'

/** One entry of a farm's log: its place in it, and the SHA-256 of the signed text that it holds, hex. */
export interface LogEntry { seq: number; digest: string }

/**
 * The digest of all entries of a season up to one of them: an entry changed, taken out or slipped in before that one makes another digest.
 * It says nothing of what comes after, nor whether what was written is true.
 * @param entries in the order of the log. @throws {RangeError} if they are not.
 * @source SHA-256 over RFC 8785 text.
 */
export function seasonDigest(farmId: string, season: number, entries: readonly LogEntry[]): string {
  entries.forEach(({ seq }, index) => {
    if (seq <= (entries[index - 1]?.seq ?? 0)) throw new RangeError(`entry ${seq} is out of order`)
  })
  return sha256Hex(canonicalText({ farmId, season, entries: entries.map(({ seq, digest }) => [seq, digest]) }))
}
