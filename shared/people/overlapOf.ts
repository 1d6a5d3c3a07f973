import type { PersonPaper } from '../contract/person.ts'

/** Civil days, the first and the last among them; null where none bounds it. */
export interface CommonDays { from: string | null; until: string | null }

type Dated = Pick<PersonPaper, 'id' | 'kind' | 'title' | 'issuedOn' | 'expiresOn'>

/**
 * On which days two papers of one person both hold, where both are the same: of one kind and name, in whatever case and spacing.
 * @returns null where they are not the same, are one and the same, or share no day.
 */
export function overlapOf(one: Dated, other: Dated): CommonDays | null {
  if (one.id === other.id || one.kind !== other.kind || plain(one.title) !== plain(other.title)) return null
  const from = [one.issuedOn, other.issuedOn].filter((day) => day !== null).sort().at(-1) ?? null
  const until = [one.expiresOn, other.expiresOn].filter((day) => day !== null).sort().at(0) ?? null
  return from !== null && until !== null && from > until ? null : { from, until }
}

const plain = (title: string): string => title.trim().replace(/\s+/g, ' ').toLowerCase()
