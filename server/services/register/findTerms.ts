import type { EntityManager } from 'typeorm'
import type { RegisterFilter } from '../../../shared/contract/register.ts'
import { foldWords } from '../../../shared/register/foldWords.ts'
import type { FarmActor } from '../../database/actor.ts'
import { TERM } from './recordTerms.ts'

/** A word that was searched for: every term from `from` up to `to`, and the people whose name has it. */
export interface SearchedWord {
  from: string
  to: string
  people: string[]
}

/** A filter as it is looked up. */
export interface RegisterSearch {
  /** Terms that a record must all have, the rarer kinds first. */
  terms: string[]
  /** Words that must each be found, the longest first. */
  words: SearchedWord[]
  /** Every term that the longest word stands for, where they are few; else null. */
  longest: string[] | null
  season: number | null
  /** From the first to the last work of the seasons asked for; null where no season is. */
  span: { from: Date; to: Date } | null
  /** The seasons asked for have no record at all. */
  isEmpty: boolean
}

/** So many lists are read side by side at most; a word that stands for more is looked up record by record. */
const MOST_LISTS = 12
/** Sorts after every character. */
const AFTER_ALL = '\u{10FFFF}'

/** Looks up what a filter stands for on this farm. */
export async function findTerms(manager: EntityManager, actor: Pick<FarmActor, 'farmId' | 'seasons'>, filter: RegisterFilter): Promise<RegisterSearch> {
  const words = await findWords(manager, actor.farmId, filter.q ?? '')
  const asked = filter.season === undefined ? actor.seasons : [filter.season]
  const span = asked === null ? null : await findSpan(manager, actor.farmId, asked)
  const [first] = words
  return {
    terms: listTerms(filter),
    words,
    longest: first === undefined ? null : await expand(manager, actor.farmId, first),
    season: filter.season ?? null,
    span: span?.from && span.to ? { from: span.from, to: span.to } : null,
    isEmpty: span !== null && span.from === null,
  }
}

function listTerms({ material, block, person, state, review, method }: RegisterFilter): string[] {
  return [
    ...(material === undefined ? [] : [TERM.material(material)]),
    ...(block === undefined ? [] : [TERM.block(block)]),
    ...(person === undefined ? [] : [TERM.person(person)]),
    ...(state === undefined || state === 'signed' ? [] : [TERM.state(state)]),
    ...(review === undefined ? [] : [TERM.review(review)]),
    ...(method === undefined ? [] : [TERM.method(method)]),
    ...(state === 'signed' ? [TERM.state(state)] : []),
  ]
}

async function findWords(manager: EntityManager, farmId: string, text: string): Promise<SearchedWord[]> {
  const words = [...new Set(foldWords(text))].sort((one, other) => other.length - one.length)
  if (words.length === 0) return []
  const people: { id: string; name: string }[] = await manager.query('SELECT id, name FROM people WHERE farm_id = $1', [farmId])
  return words.map((word) => ({
    from: TERM.word(word),
    to: TERM.word(word) + AFTER_ALL,
    people: people.filter(({ name }) => foldWords(name).some((part) => part.startsWith(word))).map(({ id }) => TERM.person(id)),
  }))
}

/** The seasons follow each other in time, so what lies in one lies between its first and its last work. */
async function findSpan(manager: EntityManager, farmId: string, seasons: readonly number[]): Promise<{ from: Date | null; to: Date | null }> {
  const [span]: [{ from: Date | null; to: Date | null }] = await manager.query(
    `SELECT min(e.from) AS from, max(e.to) AS to FROM unnest($2::integer[]) AS asked (season), LATERAL (
       SELECT min(sort_at) AS from, max(sort_at) AS to FROM register_entries WHERE farm_id = $1 AND work_season = asked.season) AS e`,
    [farmId, seasons],
  )
  return span
}

/** Steps from term to term over the index, without reading what lies between. */
async function expand(manager: EntityManager, farmId: string, { from, to, people }: SearchedWord): Promise<string[] | null> {
  const next = (above: string) => `(SELECT term FROM record_terms WHERE farm_id = $1 AND ${above} AND term < $3 ORDER BY term LIMIT 1)`
  const found: { term: string | null }[] = await manager.query(
    `WITH RECURSIVE step AS (SELECT ${next('term >= $2')} AS term UNION ALL SELECT ${next('term > step.term')} FROM step WHERE step.term IS NOT NULL)
     SELECT term FROM step LIMIT ${MOST_LISTS + 1}`,
    [farmId, from, to],
  )
  const terms = [...found.flatMap(({ term }) => term ?? []), ...people]
  return terms.length > MOST_LISTS ? null : terms
}
