import { filterQuerySchema, REGISTER_SORTS, type RegisterFilter, type RegisterSort } from '../../../shared/contract/register.ts'

/** What the register shows, as the address says it. */
export interface RegisterChoice {
  filter: RegisterFilter
  sort: RegisterSort
}
/** An address as the router gives it: anybody can have typed it. */
type AddressQuery = Record<string, unknown>

export const FILTER_NAMES = ['q', 'season', 'block', 'method', 'material', 'person', 'state', 'review'] as const satisfies readonly (keyof RegisterFilter)[]
const FIRST_SORT: RegisterSort = '-when'

/** The choice that an address stands for; what cannot be read of it is left out. */
export function readAddress(query: AddressQuery): RegisterChoice {
  const read = FILTER_NAMES.map((name) => filterQuerySchema.safeParse({ [name]: query[name] }))
  const filter: RegisterFilter = Object.assign({}, ...read.map((result) => (result.success ? withoutGaps(result.data) : {})))
  return { filter, sort: REGISTER_SORTS.find((sort) => sort === query['sort']) ?? FIRST_SORT }
}

/** The address of a choice; what is not chosen is not in it. */
export function writeAddress({ filter, sort }: RegisterChoice): Record<string, string> {
  const pairs = FILTER_NAMES.flatMap((name) => (filter[name] === undefined ? [] : [[name, String(filter[name])]]))
  return { ...(Object.fromEntries(pairs) as Record<string, string>), ...(sort !== FIRST_SORT && { sort }) }
}

/** How many parts of a filter are chosen. */
export function countChosen(filter: RegisterFilter): number {
  return FILTER_NAMES.filter((name) => filter[name] !== undefined).length
}

function withoutGaps(filter: RegisterFilter): RegisterFilter {
  return Object.fromEntries(Object.entries(filter).filter(([, value]) => value !== undefined))
}
