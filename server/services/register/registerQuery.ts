import type { RegisterSort } from '../../../shared/contract/register.ts'
import type { RegisterSearch, SearchedWord } from './findTerms.ts'

/** A statement with what is bound to it. */
export interface Statement { sql: string; params: unknown[] }

/** Where a page begins: after this key and id. */
interface PageStart { key: string; id: string }

interface Sorted { column: string; type: string; direction: 'ASC' | 'DESC' }

const KEYS = {
  when: { column: 'sort_at', type: 'timestamptz' },
  number: { column: 'number_sort', type: 'bigint' },
  area: { column: 'area_sort', type: 'double precision' },
} as const

export function keyOfSort(sort: RegisterSort): keyof typeof KEYS {
  return sort.replace('-', '') as keyof typeof KEYS
}

/**
 * The statement of a page of the register. It reads the keys of the page in order from one index, whichever fits the filter
 * best, tests what else is asked for, and then reads the records of the page alone.
 * @param columns what is read of the record `d` beside `record_id` and `key`.
 */
export function pageStatement(
  farmId: string,
  search: RegisterSearch,
  page: { sort: RegisterSort; after: PageStart | null; limit: number; columns: string; joins?: string },
): Statement {
  const params: unknown[] = [farmId]
  const bind: Bind = (value) => `$${params.push(value)}`
  const name = keyOfSort(page.sort)
  const sorted: Sorted = { ...KEYS[name], direction: page.sort.startsWith('-') ? 'DESC' : 'ASC' }
  const source = name === 'when' ? orderedByWhen(search, bind) : entries(search)
  const conditions = [
    ...spanConditions(search, source, bind),
    ...pageConditions(sorted, source.id, page.after, bind),
  ]
  const rest = [...source.terms.map((term) => hasTerm(bind(term))), ...source.words.map((word) => hasWord(word, bind))]
  const order = `ORDER BY key ${sorted.direction}, record_id ${sorted.direction}`
  const limit = `LIMIT ${bind(page.limit)}`
  if (source.table === 'application_records') {
    return { sql: `SELECT d.id AS record_id, d.sort_at AS key, ${page.columns} FROM application_records d ${page.joins ?? ''} WHERE d.farm_id = $1 ${all(conditions)} ${all(rest.map((condition) => condition('d.id')))} ${order} ${limit}`, params }
  }
  const keys = source.lists === null
    ? `SELECT d.record_id, d.${sorted.column} AS key FROM register_entries d WHERE d.farm_id = $1 ${all(conditions)} ${all(rest.map((condition) => condition('d.record_id')))} ${order} ${limit}`
    : mergedLists(source.lists, { conditions, rest, order, limit, bind })
  return {
    sql: `SELECT p.record_id, p.key, ${page.columns} FROM (${keys}) AS p JOIN application_records d ON d.farm_id = $1 AND d.id = p.record_id ${page.joins ?? ''}
      ORDER BY p.key ${sorted.direction}, p.record_id ${sorted.direction}`,
    params,
  }
}

/** Sums over the entries `d` of a filter. */
export function totalsStatement(farmId: string, search: RegisterSearch, columns: string, groupBy: string): Statement {
  const params: unknown[] = [farmId]
  const bind: Bind = (value) => `$${params.push(value)}`
  const conditions = [
    ...(search.season === null ? [] : [`d.work_season = ${bind(search.season)}`]),
    ...search.terms.map((term) => hasTerm(bind(term))('d.record_id')),
    ...search.words.map((word) => hasWord(word, bind)('d.record_id')),
  ]
  return { sql: `SELECT ${columns} FROM register_entries d WHERE d.farm_id = $1 ${all(conditions)} GROUP BY ${groupBy}`, params }
}

type Bind = (value: unknown) => string
type Condition = (id: string) => string

interface Source {
  table: string
  id: 'id' | 'record_id'
  hasSeason: boolean
  /** What the source itself does not see to. */
  terms: string[]
  words: SearchedWord[]
  /** Bound terms whose lists are read side by side. */
  lists: string[] | null
}

const entries = ({ terms, words }: RegisterSearch): Source => ({ table: 'register_entries', id: 'record_id', hasSeason: true, terms, words, lists: null })

/** The table whose index gives what was asked for in the order of time. */
function orderedByWhen(search: RegisterSearch, bind: Bind): Source {
  const { terms, words, longest, season } = search
  const [rarest, ...others] = terms
  if (longest !== null) return { table: 'record_terms', id: 'record_id', hasSeason: true, terms, words: words.slice(1), lists: longest.map(bind) }
  if (rarest !== undefined) return { table: 'record_terms', id: 'record_id', hasSeason: true, terms: others, words, lists: [bind(rarest)] }
  if (season !== null) return entries(search)
  return { table: 'application_records', id: 'id', hasSeason: false, terms, words, lists: null }
}

/** Lists that are each in order are merged as far as the page goes; a record that stands in several is given once. */
function mergedLists(
  lists: readonly string[],
  { conditions, rest, order, limit, bind }: { conditions: string[]; rest: Condition[]; order: string; limit: string; bind: Bind },
): string {
  if (lists.length === 0) return `SELECT d.record_id, d.sort_at AS key FROM record_terms d WHERE d.farm_id = $1 AND d.term = ${bind('')} ${limit}`
  const ofList = (list: string) => `SELECT d.record_id, d.sort_at AS key FROM record_terms d WHERE d.farm_id = $1 AND d.term = ${list} ${all(conditions)}`
  const tested = `WHERE true ${all(rest.map((condition) => condition('m.record_id')))} ${order} ${limit}`
  return lists.length === 1
    ? `SELECT m.record_id, m.key FROM (${ofList(lists[0] ?? '')}) AS m ${tested}`
    : `SELECT DISTINCT m.record_id, m.key FROM (${lists.map(ofList).join(' UNION ALL ')}) AS m ${tested}`
}

function spanConditions({ season, span }: RegisterSearch, { hasSeason }: Source, bind: Bind): string[] {
  return [
    ...(season !== null && hasSeason ? [`d.work_season = ${bind(season)}`] : []),
    ...(span === null ? [] : [`d.sort_at >= ${bind(span.from)}`, `d.sort_at <= ${bind(span.to)}`]),
  ]
}

function pageConditions({ column, type, direction }: Sorted, id: string, after: PageStart | null, bind: Bind): string[] {
  if (after === null) return []
  return [`(d.${column}, d.${id}) ${direction === 'DESC' ? '<' : '>'} (${bind(after.key)}::${type}, ${bind(after.id)}::uuid)`]
}

const hasTerm = (term: string): Condition => (id) =>
  `EXISTS (SELECT 1 FROM record_terms o WHERE o.farm_id = $1 AND o.record_id = ${id} AND o.term = ${term})`

function hasWord({ from, to, people }: SearchedWord, bind: Bind): Condition {
  const range = `o.term >= ${bind(from)} AND o.term < ${bind(to)}`
  const byName = people.length === 0 ? '' : bind(people)
  return (id) => {
    const found = (condition: string) => `EXISTS (SELECT 1 FROM record_terms o WHERE o.farm_id = $1 AND o.record_id = ${id} AND ${condition})`
    return byName === '' ? found(range) : `(${found(range)} OR ${found(`o.term = ANY (${byName})`)})`
  }
}

const all = (conditions: readonly string[]): string => conditions.map((condition) => `AND ${condition}`).join(' ')
